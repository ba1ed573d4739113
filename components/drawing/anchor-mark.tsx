import type { AnchorSpec } from "@/lib/calc/types";
import { anchorMark } from "@/lib/domain/drawing/anchor-marks";
import { MarkPaths } from "./mark-paths";

interface AnchorMarkProps {
  readonly spec: AnchorSpec;
  readonly size?: number;
  /** True where the anchor's name stands beside the mark. */
  readonly isDecorative?: boolean;
  readonly className?: string;
}

/** An anchor by its own cross-section. */
export function AnchorMark({ spec, size = 28, isDecorative = true, className = "" }: AnchorMarkProps) {
  const { name, paths } = anchorMark(spec);
  const naming = isDecorative ? { "aria-hidden": true } : { role: "img", "aria-label": name };
  return (
    <svg
      {...naming}
      width={size}
      height={size}
      viewBox="0 0 24 24"
      className={`inline-block shrink-0 text-ink ${className}`}
    >
      <MarkPaths paths={paths} />
    </svg>
  );
}
