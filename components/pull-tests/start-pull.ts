import type { AnchorChoice, PullTestView } from "@/lib/domain/pull-test/views";
import type { Preferences } from "@/lib/domain/preferences";
import type { PullStart } from "./pull-fields";

interface Logged {
  readonly readings: readonly PullTestView[];
  readonly anchors: readonly AnchorChoice[];
}

/** The next pull starts where the last one stood: usually only the force and what happened are new. */
export function startPull(
  { readings, anchors }: Logged,
  preferences: Preferences,
  wetness: string | undefined,
): { readonly fields: PullStart; readonly patch: "main" | "second" } {
  const [last] = readings;
  return {
    patch: last?.patch ?? "main",
    fields: {
      anchorId: anchors.find((one) => one.name === last?.anchorName)?.id ?? "",
      leanDeg: last?.leanDeg ?? null,
      lineAngleDeg: last?.lineAngleDeg ?? null,
      depthOutM: last?.depthOutM ?? 0,
      force: null,
      forceUnit: last?.forceUnit ?? preferences.forceUnit,
      outcome: null,
      wetness: last?.ground.wetness ?? wetness ?? "",
      note: "",
    },
  };
}

/** The fields as a reading has them, to correct it. */
export function startFrom(reading: PullTestView): PullStart {
  const { leanDeg, lineAngleDeg, depthOutM, force, forceUnit, outcome, note } = reading;
  const wetness = reading.ground.wetness;
  return { anchorId: "as-logged", leanDeg, lineAngleDeg, depthOutM, force, forceUnit, outcome, wetness, note };
}
