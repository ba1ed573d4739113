"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button, LinkButton } from "@/components/ui/button";
import { ConfirmButton } from "@/components/ui/confirm-button";
import { Section } from "@/components/ui/layout";
import type { FormAction } from "@/components/ui/action-form";
import type { ActionState } from "@/lib/domain/action-state";
import type { RouteView } from "@/lib/domain/route/views";
import type { Preferences } from "@/lib/domain/preferences";
import { formatDistance } from "@/lib/format/distances";
import { plural } from "@/lib/format/words";
import { DrawRoute } from "./draw-route";
import { GpxImport } from "./gpx-import";

interface LineToolsProps {
  readonly view: RouteView;
  readonly unit: Preferences["lengthUnit"];
  readonly drawAction: (state: ActionState, drawing: object) => Promise<ActionState>;
  readonly deleteAction: FormAction<null>;
}

/** Where the line is from, and how it is exchanged: a file, a drawing, or none. */
export function LineTools({ view, unit, drawAction, deleteAction }: LineToolsProps) {
  const [isDrawing, setIsDrawing] = useState(false);
  const router = useRouter();
  const { line } = view;
  return (
    <Section title="The line">
      {line && (
        <p className="mb-3 text-15">
          <b>{line.name}</b>, {line.source === "file" ? "from a file" : "by hand"}: {plural(line.pointCount, "point")},{" "}
          {formatDistance(line.lengthM, unit)}
          {line.profile.heightsM.every((height) => height === null) && ", without heights"}.
        </p>
      )}
      {line && <Remarks view={view} unit={unit} />}
      {isDrawing ? (
        <DrawRoute
          view={view}
          unit={unit}
          action={drawAction}
          onDone={() => {
            setIsDrawing(false);
            router.refresh();
          }}
        />
      ) : (
        <div className="flex flex-wrap items-start gap-3">
          <GpxImport tripId={view.tripId} unit={unit} isReplacing={line !== null} />
          <Button onClick={() => setIsDrawing(true)}>{line ? "Draw it anew by hand" : "Draw it by hand"}</Button>
          {line && (
            <>
              <LinkButton href={`/api/gpx/${view.tripId}`} prefetch={false}>
                Download GPX
              </LinkButton>
              <ConfirmButton
                label="Delete the line"
                title="Delete the line?"
                confirmLabel="Delete the line"
                action={deleteAction}
                values={{ tripId: view.tripId }}
              >
                Camps keep their positions; what was typed of the days stays. The line itself is gone.
              </ConfirmButton>
            </>
          )}
        </div>
      )}
    </Section>
  );
}

function Remarks({ view, unit }: Pick<LineToolsProps, "view" | "unit">) {
  const { breaks = [], remarks = [] } = view.line ?? {};
  const long = breaks.filter((one) => one.lengthM > 50);
  const sentences = [
    ...long
      .slice(0, 5)
      .map(
        ({ atM, lengthM }) =>
          `The line has a break of ${formatDistance(lengthM, unit)} at ${formatDistance(atM, unit)}: it is not counted.`,
      ),
    ...(long.length > 5 ? [`It has ${long.length - 5} more breaks.`] : []),
    ...remarks,
  ];
  if (sentences.length === 0) return null;
  return (
    <ul className="mb-3 list-disc pl-5 text-15 text-ochre">
      {sentences.map((sentence) => (
        <li key={sentence}>{sentence}</li>
      ))}
    </ul>
  );
}
