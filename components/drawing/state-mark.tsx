import type { Verdict } from "@/lib/calc/types";
import { STATE_MARKS } from "@/lib/domain/drawing/state-marks";
import { MarkPaths } from "./mark-paths";

export const STATE_TONES: Readonly<Record<Verdict, string>> = {
  holds: "text-ink",
  thin: "text-ochre",
  "gives-way": "text-rowan",
  unknown: "text-pencil",
};

export function stateWord(verdict: Verdict): string {
  return STATE_MARKS[verdict].word;
}

interface StateMarkProps {
  readonly verdict: Verdict;
  readonly size?: number;
  /** True where the word stands beside the mark anyway. */
  readonly isDecorative?: boolean;
  readonly className?: string;
}

/** Holds, thin, gives way or unknown: a drawn mark that carries its word. */
export function StateMark({ verdict, size = 18, isDecorative = false, className = "" }: StateMarkProps) {
  const { word, paths } = STATE_MARKS[verdict];
  const naming = isDecorative ? { "aria-hidden": true } : { role: "img", "aria-label": word };
  return (
    <svg
      {...naming}
      width={size}
      height={size}
      viewBox="0 0 24 24"
      className={`inline-block shrink-0 ${STATE_TONES[verdict]} ${className}`}
    >
      <MarkPaths paths={paths} />
    </svg>
  );
}
