"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { NumberField, SelectField } from "@/components/ui/fields";
import { GROUNDS } from "@/lib/calc/tables/grounds";
import type { GroundPatch } from "@/lib/domain/camp/schema";
import { WETNESS_OPTIONS } from "../options";

const KIND_OPTIONS = GROUNDS.map((row) => ({ value: row.kind, label: row.name }));

const centimetres = (metres: number | null | undefined) =>
  metres === null || metres === undefined ? "" : String(Math.round(metres * 1000) / 10);

/** One patch of ground: what it is by its signs, how wet, what lies on it and under it. Depths are typed in centimetres. */
export function GroundFields({
  path,
  patch,
  isOptional,
}: {
  readonly path: "details.ground" | "details.secondGround";
  readonly patch: GroundPatch | null;
  readonly isOptional: boolean;
}) {
  const [kind, setKind] = useState<string>(patch?.kind ?? "");
  const row = GROUNDS.find((one) => one.kind === kind);
  return (
    <div className="grid gap-x-8 gap-y-5 md:grid-cols-2">
      <div className="flex flex-col gap-5">
        <SelectField
          name={`${path}.kind`}
          label={isOptional ? "Kind of the second patch" : "Kind of ground"}
          options={KIND_OPTIONS}
          placeholder="Not known yet"
          value={kind}
          onChange={(event) => setKind(event.target.value)}
        />
        {kind !== "" && (
          <>
            <SelectField
              name={`${path}.wetness`}
              label="How wet"
              options={WETNESS_OPTIONS}
              placeholder="Choose"
              defaultValue={patch?.wetness ?? ""}
            />
            <div className="grid grid-cols-2 gap-4">
              <NumberField
                name={`${path}.looseTopM`}
                label="Loose top layer"
                unit="cm"
                defaultValue={centimetres(patch?.looseTopM)}
                hint={
                  row && row.looseTopM > 0 ? `Empty: ${centimetres(row.looseTopM)} cm, usual here.` : "Empty: none."
                }
              />
              <NumberField
                name={`${path}.stoneDepthM`}
                label="Stones at"
                unit="cm"
                defaultValue={centimetres(patch?.stoneDepthM)}
                hint="Empty: none met."
              />
            </div>
          </>
        )}
      </div>
      {row ? (
        <div className="border-l-2 border-hair pl-5">
          <p className="text-15">{row.description}</p>
          <dl className="mt-3 grid grid-cols-[4rem_1fr] gap-y-2 text-15">
            {(["thumb", "heel", "rod"] as const).map((sign) => (
              <div key={sign} className="contents">
                <dt className="text-pencil capitalize">{sign}</dt>
                <dd>{row.signs[sign]}</dd>
              </div>
            ))}
          </dl>
          {row.model.kind === "undriveable" && (
            <p className="mt-3 text-15 font-semibold text-ochre">{row.model.reason}</p>
          )}
        </div>
      ) : (
        <p className="max-w-[28rem] border-l-2 border-hair pl-5 text-15 text-pencil">
          Choose by what thumb, heel and a 12 mm rod tell you; the signs of each ground appear here. Without a ground no
          margin is worked out.
        </p>
      )}
    </div>
  );
}

/** The second patch is there only when the camp has one. */
export function SecondGround({
  patch,
  onChanged,
}: {
  readonly patch: GroundPatch | null;
  readonly onChanged: () => void;
}) {
  const [isShown, setIsShown] = useState(patch !== null);
  const show = (next: boolean) => {
    setIsShown(next);
    onChanged();
  };
  if (!isShown) {
    return (
      <Button className="mt-6" onClick={() => show(true)}>
        Add a second patch
      </Button>
    );
  }
  return (
    <fieldset className="mt-8 border-t border-hair pt-5">
      <legend className="pr-3 text-15 font-bold">Second patch of ground</legend>
      <GroundFields path="details.secondGround" patch={patch} isOptional />
      <Button look="quiet" className="mt-3" onClick={() => show(false)}>
        There is no second patch
      </Button>
    </fieldset>
  );
}
