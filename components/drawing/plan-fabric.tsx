import type { ShelterModel } from "@/lib/calc/types";
import { linePath, type Point } from "@/lib/domain/drawing/path";
import type { PlanLayout } from "./plan-layout";

interface PlanFabricProps {
  readonly model: ShelterModel;
  readonly headingDeg: number;
  readonly wind: { readonly fromDeg: number | null; readonly toDeg: number | null } | null;
  readonly layout: PlanLayout;
}

/** The cloth from above: outline and seams; the parts that face the wind are toned. */
export function PlanFabric({ model, headingDeg, wind, layout: { view, fit } }: PlanFabricProps) {
  const outline = linePath(view.outline.map(fit.place), true);
  const facing = windwardZones(model, headingDeg, wind);
  const quads = model.panels
    .filter((panel) => facing.has(panel.zone))
    .map((panel) => {
      const corners = panel.nodes.flatMap((index): Point[] => {
        const node = model.nodes[index];
        return node ? [fit.place(view.toPaper(node.position))] : [];
      });
      return linePath(corners, true);
    })
    .join("");
  return (
    <>
      <path d={outline} className="fill-paper" />
      {quads && (
        <>
          <g className="fill-hair stroke-hair" opacity={0.42}>
            <path d={quads} strokeWidth={0.8} strokeLinejoin="round" />
          </g>
          <path d={quads} fill="none" className="stroke-hair" strokeWidth={0.6} opacity={0.9} />
        </>
      )}
      {view.seams.map(([from, to]) => (
        <path
          key={linePath([from, to])}
          d={linePath([fit.place(from), fit.place(to)])}
          className="stroke-pencil"
          strokeWidth={0.9}
          opacity={0.55}
        />
      ))}
      <path d={outline} fill="none" className="stroke-ink" strokeWidth={1.8} strokeLinejoin="round" />
    </>
  );
}

/** Zones whose outward normal, taken over their panels, leans towards where the wind comes from. */
function windwardZones(model: ShelterModel, headingDeg: number, wind: PlanFabricProps["wind"]): ReadonlySet<string> {
  if (!wind || wind.fromDeg === null || wind.toDeg === null) return new Set();
  const span = (((wind.toDeg - wind.fromDeg) % 360) + 360) % 360;
  const bearing = ((wind.fromDeg + span / 2 - headingDeg) * Math.PI) / 180;
  const sums = new Map<string, number>();
  for (const panel of model.panels) {
    const [a, b, c, d] = panel.nodes.map((index) => model.nodes[index]?.position);
    if (!a || !b || !c || !d) continue;
    const [ux, uy, uz] = [c.x - a.x, c.y - a.y, c.z - a.z];
    const [vx, vy, vz] = [d.x - b.x, d.y - b.y, d.z - b.z];
    const normalX = uy * vz - uz * vy;
    const normalY = uz * vx - ux * vz;
    const facing = normalX * Math.sin(bearing) + normalY * Math.cos(bearing);
    sums.set(panel.zone, (sums.get(panel.zone) ?? 0) + facing);
  }
  return new Set([...sums].filter(([, sum]) => sum > 1e-6).map(([zone]) => zone));
}
