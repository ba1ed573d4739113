"use client";

import { useRef, type PointerEvent } from "react";
import { heightAtM } from "@/lib/calc/route/profile";
import type { RouteStop, RouteView } from "@/lib/domain/route/views";
import type { Preferences } from "@/lib/domain/preferences";
import { formatDistance, LONG_UNITS } from "@/lib/format/distances";
import { METRES } from "@/lib/format/factors";
import { formatAltitude } from "@/lib/format/lengths";
import { CampHandle } from "./camp-handle";
import { outlineProfile, PROFILE_HEIGHT, scaleProfile, type ProfileScale } from "./profile-scale";
import { useWidth } from "./use-width";

export interface CampMoves {
  readonly selectedId: string | null;
  readonly onSelect: (campId: string) => void;
  /** While it is dragged: nothing is saved. */
  readonly onMove: (campId: string, atM: number) => void;
  /** Without a place: where it was moved to last. */
  readonly onDrop: (campId: string, atM?: number) => void;
  /** Back to where it was saved. */
  readonly onCancel: (campId: string) => void;
}

/** Longest name over the profile. */
const MAX_LABEL = 16;

/**
 * The way in profile with its camps. Drag a camp, move it with the arrow keys, or select it and tap a place; who may not
 * change anything sees the same without handles.
 */
export function ElevationProfile({
  view,
  unit,
  moves,
}: {
  readonly view: RouteView;
  readonly unit: Preferences["lengthUnit"];
  readonly moves: CampMoves | null;
}) {
  const { ref, width } = useWidth(760);
  const svg = useRef<SVGSVGElement>(null);
  const { line } = view;
  if (!line) return null;
  const { profile } = line;
  const scale = scaleProfile(profile, width, METRES[unit], LONG_UNITS[unit].metres);
  const stops = view.stops.filter((stop): stop is RouteStop & { atM: number } => stop.atM !== null);
  const selected = stops.find((stop) => stop.campId === moves?.selectedId);
  const atOf = (event: PointerEvent) => scale.atOf(event.clientX - (svg.current?.getBoundingClientRect().left ?? 0));
  const summary = stops.map((stop) => `${stop.name} at ${formatDistance(stop.atM, unit)}`).join(", ");
  return (
    <figure className="mb-2">
      <div ref={ref} className="w-full">
        <svg
          ref={svg}
          width={width}
          height={PROFILE_HEIGHT}
          role="group"
          aria-label={`Profile of the way, ${formatDistance(profile.lengthM, unit)}. ${summary}`}
          className="block max-w-full select-none"
          onPointerUp={(event) => {
            // Tap-only way: the selected camp comes to where the profile is tapped.
            if (!moves || !selected || !(event.target instanceof Element)) return;
            if (event.target.closest("[data-camp-handle]")) return;
            const index = stops.indexOf(selected);
            const least = stops[index - 1]?.atM ?? 0;
            const most = stops[index + 1]?.atM ?? profile.lengthM;
            moves.onDrop(selected.campId, Math.min(most, Math.max(least, atOf(event))));
          }}
        >
          <Axes scale={scale} unit={unit} />
          {outlineProfile(profile, scale).map((path) => (
            <Ground key={path} path={path} floor={scale.floor} />
          ))}
          {line.breaks.map((one) => (
            <path
              key={one.atM}
              d={`M${scale.xOf(one.atM)} ${scale.top}V${scale.floor}`}
              className="stroke-ember"
              strokeWidth={1}
              strokeDasharray="2 4"
            />
          ))}
          {stops.map((stop, index) => (
            <CampHandle
              key={stop.campId}
              stop={stop}
              number={view.stops.findIndex((one) => one.campId === stop.campId) + 1}
              label={stop.name.length > MAX_LABEL ? `${stop.name.slice(0, MAX_LABEL - 1)}…` : stop.name}
              isUpper={index % 2 === 1}
              heightM={heightAtM(profile, stop.atM)}
              scale={scale}
              limits={{ least: stops[index - 1]?.atM ?? 0, most: stops[index + 1]?.atM ?? profile.lengthM }}
              valueText={`${formatDistance(stop.atM, unit)} along the way${describeHeight(profile, stop.atM, unit)}`}
              moves={moves}
              atOf={atOf}
            />
          ))}
        </svg>
      </div>
      <figcaption className="text-13 text-pencil">
        {`${LONG_UNITS[unit].name} along the way, heights in ${unit}. `}
        {moves && stops.length > 0 && "Drag a camp, or select it and tap a place; with keys, the arrows move it."}
      </figcaption>
    </figure>
  );
}

function describeHeight(
  profile: Parameters<typeof heightAtM>[0],
  atM: number,
  unit: Preferences["lengthUnit"],
): string {
  const heightM = heightAtM(profile, atM);
  return heightM === null ? "" : `, ${formatAltitude(heightM, unit)} high`;
}

function Ground({ path, floor }: { readonly path: string; readonly floor: number }) {
  const numbers = path.slice(1).split("L");
  const first = numbers[0]?.split(" ")[0];
  const last = numbers[numbers.length - 1]?.split(" ")[0];
  return (
    <>
      <path d={`${path}L${last} ${floor}L${first} ${floor}Z`} className="fill-hair" opacity={0.45} />
      <path d={path} className="stroke-ink" strokeWidth={1.8} fill="none" strokeLinejoin="round" />
    </>
  );
}

function Axes({ scale, unit }: { readonly scale: ProfileScale; readonly unit: Preferences["lengthUnit"] }) {
  return (
    <g aria-hidden="true">
      {scale.heightTicks.map((tick) => (
        <g key={tick.label}>
          <path d={`M${scale.left} ${tick.y}H${scale.right}`} className="stroke-hair" strokeWidth={1} />
          <text x={scale.left - 8} y={tick.y + 4} textAnchor="end" className="fill-pencil text-13">
            {tick.label}
          </text>
        </g>
      ))}
      <path d={`M${scale.left} ${scale.floor}H${scale.right}`} className="stroke-pencil" strokeWidth={1} />
      {scale.distanceTicks.map((tick, index) => (
        <g key={tick.label}>
          <path d={`M${tick.x} ${scale.floor}v5`} className="stroke-pencil" strokeWidth={1} />
          <text x={tick.x} y={scale.floor + 20} textAnchor="middle" className="fill-pencil text-13">
            {index === 0 ? LONG_UNITS[unit].name : tick.label}
          </text>
        </g>
      ))}
    </g>
  );
}
