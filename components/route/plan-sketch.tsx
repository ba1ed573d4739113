"use client";

import type { ReactNode } from "react";
import type { LatLon } from "@/lib/calc/places/utm";
import type { SimplifiedLine } from "@/lib/domain/route/schema";
import type { RouteView } from "@/lib/domain/route/views";
import type { Preferences } from "@/lib/domain/preferences";
import { PlanFurniture } from "./plan-furniture";
import { projectAll, type PlanProjection } from "./plan-projection";
import { useWidth } from "./use-width";

export const SKETCH_HEIGHT = 380;

export interface SketchCamp extends LatLon {
  readonly id: string;
  readonly name: string;
  readonly number: number;
}

/** Camps by their own positions. */
export function listSketchCamps(view: RouteView): readonly SketchCamp[] {
  return view.stops.flatMap(({ campId, name, latitude, longitude }, index) =>
    latitude === null || longitude === null ? [] : [{ id: campId, name, number: index + 1, latitude, longitude }],
  );
}

function pathOf(piece: SimplifiedLine[number], projection: PlanProjection): string {
  const points = piece.map(([latitude, longitude]) => projection.toXy({ latitude, longitude }));
  return `M${points.map(({ x, y }) => `${x.toFixed(1)} ${y.toFixed(1)}`).join("L")}`;
}

/** The way and its camps from above, north up. Pieces are not joined across breaks. */
export function PlanSketch({ view, unit }: { readonly view: RouteView; readonly unit: Preferences["lengthUnit"] }) {
  const { ref, width } = useWidth(760);
  const size = { width, height: SKETCH_HEIGHT };
  const camps = listSketchCamps(view);
  const line = view.line?.simplified ?? [];
  const linePlaces = line.flat().map(([latitude, longitude]) => ({ latitude, longitude }));
  const projection = projectAll([...linePlaces, ...camps], size);
  if (!projection) return null;
  const ends = [linePlaces[0], linePlaces[linePlaces.length - 1]];
  return (
    <div ref={ref} className="w-full border border-hair bg-sheet">
      <svg
        width={width}
        height={SKETCH_HEIGHT}
        role="img"
        aria-label={`The way from above, with ${camps.map((camp) => camp.name).join(", ")}`}
        className="block max-w-full"
      >
        {line.map((piece, index) => (
          <path
            key={index}
            d={pathOf(piece, projection)}
            className="stroke-spruce"
            strokeWidth={2.2}
            fill="none"
            strokeLinejoin="round"
            strokeLinecap="round"
          />
        ))}
        {ends.map((end, index) => {
          if (!end) return null;
          const { x, y } = projection.toXy(end);
          return index === 0 ? (
            <circle key="start" cx={x} cy={y} r={5} className="fill-sheet stroke-spruce" strokeWidth={2} />
          ) : (
            <rect key="end" x={x - 4.5} y={y - 4.5} width={9} height={9} className="fill-spruce" />
          );
        })}
        <SketchCamps camps={camps} projection={projection} width={width} />
        <PlanFurniture metresPerPixel={projection.metresPerPixel} unit={unit} size={size} />
      </svg>
    </div>
  );
}

export function SketchCamps({
  camps,
  projection,
  width,
  children,
}: {
  readonly camps: readonly SketchCamp[];
  readonly projection: PlanProjection;
  readonly width: number;
  readonly children?: ReactNode;
}) {
  return (
    <g aria-hidden="true">
      {camps.map((camp) => {
        const { x, y } = projection.toXy(camp);
        const isLeft = x > width - 130;
        return (
          <g key={camp.id}>
            <circle cx={x} cy={y} r={10} className="fill-sheet stroke-ink" strokeWidth={1.6} />
            <text x={x} y={y + 4.5} textAnchor="middle" className="fill-ink text-13 font-bold">
              {camp.number}
            </text>
            <text
              x={isLeft ? x - 16 : x + 16}
              y={y + 4.5}
              textAnchor={isLeft ? "end" : "start"}
              className="fill-ink stroke-sheet text-13 font-semibold"
              strokeWidth={4}
              paintOrder="stroke"
            >
              {camp.name}
            </text>
          </g>
        );
      })}
      {children}
    </g>
  );
}
