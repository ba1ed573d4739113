interface ForceBarsProps {
  readonly pullN: number | null;
  readonly capacityN: number | null;
  /** End of the scale, N; the same for all bars that are compared. */
  readonly scaleN: number;
  /** Distance of the ticks, N. */
  readonly tickN: number;
  /** Colour class of the capacity bar, by verdict. */
  readonly tone: string;
}

const WIDTH = 220;

/** Pull and capacity as two bars on one newton scale. The numbers stand beside it in words. */
export function ForceBars({ pullN, capacityN, scaleN, tickN, tone }: ForceBarsProps) {
  const at = (newtons: number) => Math.min(1, newtons / scaleN) * WIDTH;
  const ticks = Array.from({ length: Math.floor(scaleN / tickN + 1e-9) }, (_, i) => `M${at((i + 1) * tickN)} 16.5V20`);
  const isBeyond = capacityN !== null && capacityN > scaleN;
  return (
    <svg viewBox={`0 0 ${WIDTH} 20`} preserveAspectRatio="none" aria-hidden="true" className="block h-5 w-full">
      {pullN !== null && <rect x={0} y={1} width={Math.max(1, at(pullN))} height={6} className="fill-ember" />}
      {capacityN !== null && (
        <path
          d={
            isBeyond ? `M${WIDTH} 9.5H.75V14.75H${WIDTH}` : `M.75 9.5H${Math.max(1.5, at(capacityN) - 0.75)}V14.75H.75Z`
          }
          className={`fill-none ${tone}`}
          stroke="currentColor"
          strokeWidth={1.5}
          vectorEffect="non-scaling-stroke"
        />
      )}
      <path
        d={`M0 18.5H${WIDTH}${ticks.join("")}`}
        className="stroke-hair"
        strokeWidth={1}
        vectorEffect="non-scaling-stroke"
      />
    </svg>
  );
}

/** A round scale for the pulls: a little beyond the largest, so that bars can be compared by eye. */
export function forceScale(pulls: readonly (number | null)[]): { readonly scaleN: number; readonly tickN: number } {
  const largest = Math.max(100, ...pulls.map((pull) => pull ?? 0)) * 1.8;
  const tickN = [25, 50, 100, 200, 500, 1000, 2000, 5000].find((tick) => largest / tick <= 6) ?? 10_000;
  return { scaleN: Math.ceil(largest / tickN) * tickN, tickN };
}
