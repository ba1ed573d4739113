"use client";

import { shelterKind } from "@/lib/calc/shelter-kinds";
import { formatCompass } from "@/lib/format/angles";
import { lengthFromUnit } from "@/lib/format/lengths";
import { Button } from "@/components/ui/button";
import { useBoard } from "./board-context";
import { CommitNumber } from "./commit-number";

/** How the shelter stands: heading, pitched heights, patch of ground. Each change is worked out anew. */
export function PitchPanel() {
  const { view, board, pitch, preferences } = useBoard();
  const { details, spec } = pitch;
  const perMetre = 1 / lengthFromUnit(1, preferences.lengthUnit);
  const pitched = shelterKind(spec.kind).dimensions.filter((dimension) => dimension.pitched);
  const turn = (deg: number) =>
    board.repitch(pitch.id, { ...details, headingDeg: (((details.headingDeg + deg) % 360) + 360) % 360 });
  return (
    <div className="flex flex-wrap items-end gap-x-4 gap-y-3 rounded-sheet border border-hair bg-sheet p-4">
      <Button onClick={() => turn(-15)} aria-label="Turn 15° to the left">
        −15°
      </Button>
      <div className="w-32">
        <CommitNumber
          label={`Front faces, ° (${formatCompass(details.headingDeg)})`}
          value={Math.round(details.headingDeg)}
          min={0}
          max={360}
          onCommit={(headingDeg) => board.repitch(pitch.id, { ...details, headingDeg: headingDeg % 360 })}
        />
      </div>
      <Button onClick={() => turn(15)} aria-label="Turn 15° to the right">
        +15°
      </Button>
      {pitched.map((dimension) => (
        <div key={dimension.key} className="w-36">
          <CommitNumber
            label={`${dimension.label}, ${preferences.lengthUnit}`}
            value={Number(((spec.dimensions[dimension.key] ?? dimension.typicalM) * perMetre).toFixed(2))}
            min={dimension.minM * perMetre}
            max={dimension.maxM * perMetre}
            onCommit={(length) =>
              board.repitch(pitch.id, {
                ...details,
                dimensions: {
                  ...details.dimensions,
                  [dimension.key]: lengthFromUnit(length, preferences.lengthUnit),
                },
              })
            }
          />
        </div>
      ))}
      {view.camp.details.secondGround && (
        <label className="flex flex-col gap-1 text-13 text-pencil">
          Stands on
          <select
            value={details.patch}
            onChange={(event) =>
              board.repitch(pitch.id, { ...details, patch: event.target.value === "second" ? "second" : "main" })
            }
            className="min-h-11 rounded-field border border-pencil bg-sheet px-2 text-15 text-ink"
          >
            <option value="main">the main ground</option>
            <option value="second">the second patch</option>
          </select>
        </label>
      )}
    </div>
  );
}
