import { anchorCapacity } from "@/lib/calc/capacity";
import { BUILT_IN_ANCHORS } from "@/lib/calc/tables/anchors";
import type { AnchorSpec, Capacity } from "@/lib/calc/types";
import type { z } from "zod";
import { quickCheckInput, type QuickCheckInput } from "@/lib/domain/quick-check/schema";
import { AppError } from "@/lib/errors";
import { parseInput } from "../trips/parse-input";

const MAX_RESULTS = 200;

export interface QuickCheckResult {
  readonly anchor: { readonly name: string | null; readonly spec: AnchorSpec };
  readonly results: readonly {
    readonly lineAngleDeg: number;
    readonly leanDeg: number;
    readonly capacity: Capacity;
  }[];
}

function findAnchor(anchor: QuickCheckInput["anchor"], field: string): { name: string | null; spec: AnchorSpec } {
  if (typeof anchor !== "string") return { name: null, spec: anchor };
  const builtIn = BUILT_IN_ANCHORS.find((one) => one.id === anchor);
  if (builtIn) return { name: builtIn.name, spec: builtIn.spec };
  const message = `There is no built-in anchor "${anchor}".`;
  throw new AppError("bad-input", message, { fieldErrors: { [field]: [message] } });
}

function listAngles(angle: QuickCheckInput["lineAngleDeg"]): number[] {
  if (typeof angle === "number") return [angle];
  const count = Math.floor((angle.to - angle.from) / angle.step + 1e-9) + 1;
  return Array.from({ length: count }, (_, index) => angle.from + index * angle.step);
}

/** What one anchor holds in one ground under one line, with its working; for a sweep, one result per pair of angles. */
export function checkAnchor({ input }: { input: z.input<typeof quickCheckInput> }): QuickCheckResult {
  const check = parseInput(quickCheckInput, input);
  const anchor = findAnchor(check.anchor, "anchor");
  const second = check.tandem && findAnchor(check.tandem.anchor, "tandem.anchor");
  const lineAngles = listAngles(check.lineAngleDeg);
  const leans = listAngles(check.leanDeg);
  if (lineAngles.length * leans.length > MAX_RESULTS) {
    const message = `That is ${lineAngles.length * leans.length} results; at most ${MAX_RESULTS} at once.`;
    throw new AppError("bad-input", message, { fieldErrors: { "lineAngleDeg.step": [message] } });
  }
  const { depthOutM, rockKg, shockCord, line, knot, tandem, ground } = check;
  const inLine = tandem && second ? { anchor: second.spec, spacingM: tandem.spacingM } : null;
  try {
    const results = lineAngles.flatMap((lineAngleDeg) =>
      leans.map((leanDeg) => ({
        lineAngleDeg,
        leanDeg,
        capacity: anchorCapacity({
          anchor: anchor.spec,
          ground,
          lineAngleDeg,
          rigging: { leanDeg, depthOutM, rockKg, shockCord, line, knot, tandem: inLine },
        }),
      })),
    );
    return { anchor, results };
  } catch (error) {
    // A measure that is fine by itself may be out of range for the formula (a blade longer than the stake …).
    if (error instanceof RangeError) throw new AppError("bad-input", error.message, { cause: error });
    throw error;
  }
}
