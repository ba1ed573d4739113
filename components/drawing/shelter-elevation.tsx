import { useId } from "react";
import type { ShelterModel, Vec3 } from "@/lib/calc/types";
import { linePath, type Point } from "@/lib/domain/drawing/path";
import { scaleBar } from "@/lib/domain/drawing/plan-view";
import { formatLength } from "@/lib/format/lengths";
import { ScaleBar } from "./plan-furniture";

interface ShelterElevationProps {
  readonly model: ShelterModel;
  /** Seen from the front (default) or from its right side. */
  readonly from?: "front" | "side";
  readonly width?: number;
  readonly height?: number;
  readonly label: string;
  readonly className?: string;
}

/** The shelter from the front or the side, to scale: cloth, poles, lines, the ground and its height. */
export function ShelterElevation({
  model,
  from = "front",
  width = 520,
  height = 260,
  label,
  className = "block h-auto w-full",
}: ShelterElevationProps) {
  const titleId = useId();
  // From the front one looks along −y with +x to the left; from the right along −x with +y to the right.
  const across = (p: Vec3) => (from === "front" ? -p.x : p.y);
  const towards = (p: Vec3) => (from === "front" ? p.y : p.x);
  const nodes = model.nodes.map((node) => node.position);
  const all = [...nodes, ...model.tieOuts.flatMap((tie) => [tie.point, tie.anchor])];
  const minAcross = Math.min(...all.map(across));
  const maxAcross = Math.max(...all.map(across));
  const topM = Math.max(...nodes.map((p) => p.z));
  const groundY = height - 44;
  const scale = Math.min((width - 150) / Math.max(0.5, maxAcross - minAcross), (groundY - 24) / Math.max(0.3, topM));
  const middle = (minAcross + maxAcross) / 2;
  const place = (p: Vec3): Point => [width / 2 - 24 + (across(p) - middle) * scale, groundY - p.z * scale];

  const panels = model.panels
    .flatMap((panel) => {
      const corners = panel.nodes.flatMap((index) => nodes[index] ?? []);
      if (corners.length < 4) return [];
      const depth = corners.reduce((sum, corner) => sum + towards(corner), 0) / corners.length;
      return [{ depth, d: linePath(corners.map(place), true) }];
    })
    .sort((a, b) => a.depth - b.depth);
  const links = (role: "edge" | "ridge" | "line") =>
    model.links
      .filter((link) => link.role === role)
      .flatMap((link) => {
        const [a, b] = [nodes[link.a], nodes[link.b]];
        return a && b ? [linePath([place(a), place(b)])] : [];
      })
      .join("");
  const poles = model.poles
    .flatMap((pole) => {
      const [foot, head] = [nodes[pole.foot], nodes[pole.head]];
      return foot && head ? [linePath([place(foot), place(head)])] : [];
    })
    .join("");
  const hoops = model.hoops
    .map((hoop) => linePath(hoop.nodes.flatMap((index) => (nodes[index] ? [place(nodes[index])] : []))))
    .join("");
  const bar = scaleBar(scale, 100);
  const heightX = width / 2 - 24 + (maxAcross - middle) * scale + 26;
  const topY = groundY - topM * scale;

  return (
    <svg viewBox={`0 0 ${width} ${height}`} className={className} role="img" aria-labelledby={titleId}>
      <title id={titleId}>{label}</title>
      <path d={poles} className="stroke-ink" strokeWidth={2.4} strokeLinecap="round" fill="none" />
      <g className="fill-paper stroke-hair" strokeWidth={0.8} strokeLinejoin="round">
        {panels.map((panel, index) => (
          <path key={index} d={panel.d} />
        ))}
      </g>
      <path d={links("edge")} className="stroke-ink" strokeWidth={1.3} strokeLinecap="round" fill="none" />
      <path d={links("ridge")} className="stroke-ink" strokeWidth={2.2} strokeLinecap="round" fill="none" />
      <path d={hoops} className="stroke-ink" strokeWidth={2.2} strokeLinecap="round" fill="none" />
      <path d={links("line")} className="stroke-pencil" strokeWidth={1.1} strokeLinecap="round" fill="none" />
      <path d={`M12 ${groundY}H${width - 12}`} className="stroke-ink" strokeWidth={1.5} />
      <path d={hatch(width, groundY)} className="stroke-pencil" strokeWidth={0.8} opacity={0.7} />
      <g className="stroke-pencil" fill="none" strokeWidth={1}>
        <path d={`M${heightX} ${topY}V${groundY}M${heightX - 4} ${topY}H${heightX + 4}`} />
      </g>
      <text x={heightX + 7} y={(topY + groundY) / 2 + 4} className="fill-pencil text-13">
        {formatLength(topM)}
      </text>
      <ScaleBar at={[20 + bar.length / 2, height - 16]} length={bar.length} lengthM={bar.lengthM} />
    </svg>
  );
}

function hatch(width: number, y: number): string {
  return Array.from({ length: Math.floor((width - 40) / 26) }, (_, i) => {
    const x = 24 + i * 26;
    return `M${x} ${y + 8}L${x + 7} ${y + 1}`;
  }).join("");
}
