"use client";

import { ShelterElevation } from "@/components/drawing/shelter-elevation";
import { ShelterPlan } from "@/components/drawing/shelter-plan";
import type { ShelterModel } from "@/lib/calc/types";
import { formatLength } from "@/lib/format/lengths";
import { plural } from "@/lib/format/words";

/** Plan and elevations of what is typed; the last shape that can be built stays while the typed one can't. */
export function LiveDrawing({
  model,
  name,
  headingDeg = 0,
  wind = null,
  isPitched = false,
  problem,
}: {
  readonly model: ShelterModel;
  readonly name: string;
  readonly headingDeg?: number;
  readonly wind?: { readonly fromDeg: number | null; readonly toDeg: number | null } | null;
  /** At a camp: then north and wind have a meaning. */
  readonly isPitched?: boolean;
  readonly problem: string | null;
}) {
  const xs = model.tieOuts.map((tie) => tie.anchor.x);
  const ys = model.tieOuts.map((tie) => tie.anchor.y);
  const acrossM = Math.max(...xs) - Math.min(...xs);
  const alongM = Math.max(...ys) - Math.min(...ys);
  return (
    <figure className="flex flex-col gap-3">
      <div className={`rounded-sheet border border-hair bg-sheet ${problem ? "opacity-50" : ""}`}>
        <ShelterPlan
          model={model}
          headingDeg={headingDeg}
          hasNorth={isPitched}
          wind={wind}
          width={440}
          height={330}
          label={`${name} in plan with ${plural(model.tieOuts.length, "tie-out")}`}
        />
      </div>
      <div className={`grid gap-1 ${problem ? "opacity-50" : ""}`}>
        <ShelterElevation model={model} from="front" width={440} height={170} label={`${name} from the front`} />
        <ShelterElevation model={model} from="side" width={440} height={170} label={`${name} from its right side`} />
      </div>
      <figcaption aria-live="polite" className="text-13 text-pencil">
        {problem ??
          `${plural(model.tieOuts.length, "tie-out")}. From anchor to anchor ${formatLength(acrossM)} across and ${formatLength(alongM)} along.`}
      </figcaption>
    </figure>
  );
}
