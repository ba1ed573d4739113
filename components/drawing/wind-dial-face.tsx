import { arcPath, linePath, polar, pointText, type Point } from "@/lib/domain/drawing/path";
import { windSector } from "@/lib/domain/drawing/wind-sector";

export const DIAL_SIZE = 240;
export const DIAL_RADIUS = 84;
const CENTRE: Point = [DIAL_SIZE / 2, DIAL_SIZE / 2];
const LETTERS = ["N", "E", "S", "W"];

interface WindDialFaceProps {
  readonly fromDeg: number | null;
  readonly toDeg: number | null;
}

/** A compass card with the sector that the wind may come from; the wind blows towards the middle. */
export function WindDialFace({ fromDeg, toDeg }: WindDialFaceProps) {
  const isKnown = fromDeg !== null && toDeg !== null;
  const span = isKnown ? (((toDeg - fromDeg) % 360) + 360) % 360 : 360;
  const sector = windSector(fromDeg, toDeg, 46, { centre: CENTRE, arrowLength: 26, arrowHead: 8 });
  const ticks = Array.from({ length: 24 }, (_, i) => {
    const isLong = i % 6 === 0;
    return linePath([polar(CENTRE, DIAL_RADIUS - (isLong ? 9 : 5), i * 15), polar(CENTRE, DIAL_RADIUS, i * 15)]);
  }).join("");
  return (
    <svg viewBox={`0 0 ${DIAL_SIZE} ${DIAL_SIZE}`} aria-hidden="true" className="block h-auto w-full">
      <circle cx={CENTRE[0]} cy={CENTRE[1]} r={DIAL_RADIUS} className="fill-sheet stroke-ink" strokeWidth={1.2} />
      {isKnown && span > 0 && (
        <path
          d={wedge(fromDeg, toDeg)}
          className="fill-tarn-wash stroke-tarn"
          strokeWidth={1.2}
          strokeLinejoin="round"
        />
      )}
      <path d={ticks} className="stroke-pencil" strokeWidth={1} />
      {LETTERS.map((letter, index) => {
        const [x, y] = polar(CENTRE, DIAL_RADIUS + 22, index * 90);
        return (
          <text key={letter} x={x} y={y + 4.5} textAnchor="middle" className="fill-ink text-13 font-bold">
            {letter}
          </text>
        );
      })}
      <g className="stroke-tarn" fill="none" strokeWidth={1.8} strokeLinecap="round" strokeLinejoin="round">
        {sector.arrows.map((arrow) => (
          <path key={arrow.d} d={arrow.d} opacity={isKnown ? 1 : 0.55} />
        ))}
      </g>
      <path
        d={`M${CENTRE[0] - 9} ${CENTRE[1] + 6}L${CENTRE[0]} ${CENTRE[1] - 8}L${CENTRE[0] + 9} ${CENTRE[1] + 6}Z`}
        className="fill-paper stroke-ink"
        strokeWidth={1.4}
        strokeLinejoin="round"
      />
    </svg>
  );
}

function wedge(fromDeg: number, toDeg: number): string {
  return `M${pointText(CENTRE)}L${arcPath(CENTRE, DIAL_RADIUS, fromDeg, toDeg).slice(1)}Z`;
}
