import Link from "next/link";
import { AnchorMark } from "@/components/drawing/anchor-mark";
import { OneButtonForm } from "@/components/forms/one-button-form";
import type { FormAction } from "@/components/ui/action-form";
import type { PullTestView } from "@/lib/domain/pull-test/views";
import { formatInstant } from "@/lib/format/days";
import { describeFit, describeOutcome, describePull, describeSetUp, formatFactor } from "@/lib/format/pull-tests";

interface PullTestListProps {
  readonly readings: readonly PullTestView[];
  readonly timeZone: string;
  /** The page of one reading, without its id. */
  readonly base: string;
  readonly switchAction: FormAction<null>;
  /** True where readings of several grounds stand in one list. */
  readonly showsGround: boolean;
}

/** Each reading with what it does to the estimate and how it fits; switched off rather than lost. */
export function PullTestList({ readings, timeZone, base, switchAction, showsGround }: PullTestListProps) {
  return (
    <ul>
      {readings.map((reading) => (
        <li
          key={reading.id}
          className="grid grid-cols-[2.5rem_minmax(0,1fr)] gap-x-3 gap-y-1 border-t border-hair py-3 first:border-t-0 sm:grid-cols-[2.5rem_minmax(0,1fr)_minmax(0,15rem)_auto]"
        >
          <span className="pt-0.5">
            <AnchorMark spec={reading.anchor} size={34} />
          </span>
          <div className="min-w-0">
            <h3 className={`text-15 font-bold ${reading.isOff ? "text-pencil line-through" : ""}`}>
              <Link href={`${base}/${reading.id}`} className="hover:text-spruce hover:underline">
                {reading.anchorName}: {describeOutcome(reading)}
              </Link>
            </h3>
            <p className="text-13 text-pencil">{describeSetUp(reading)}</p>
            <p className="text-13 text-pencil">
              {showsGround && `${reading.place}, ${reading.groundName.toLowerCase()} · `}
              {reading.patch === "second" && "second patch · "}
              {formatInstant(reading.pulledAt, timeZone)} · {reading.loggedByName}
              {reading.hasPhoto && " · photo"}
            </p>
            {reading.note && <p className="text-13 whitespace-pre-line">{reading.note}</p>}
          </div>
          <FitWords reading={reading} />
          <div className="col-start-2 sm:col-start-4">
            <OneButtonForm
              action={switchAction}
              values={{ pullTestId: reading.id, "isOff:boolean": String(!reading.isOff) }}
              look="outline"
            >
              {reading.isOff ? "Switch on" : "Switch off"}
              <span className="sr-only">
                {" "}
                {reading.anchorName}, {describeOutcome(reading)}
              </span>
            </OneButtonForm>
          </div>
        </li>
      ))}
    </ul>
  );
}

function FitWords({ reading: { fit } }: { readonly reading: PullTestView }) {
  const isOdd = fit.status === "implausible" || (fit.status === "counts" && fit.isOutlier);
  return (
    <div className="col-start-2 text-13 sm:col-start-3">
      {fit.status === "counts" && (
        <p>
          <span className="font-bold">
            {fit.kind === "at-least" && "at least "}
            {formatFactor(fit.ratio)} the table
          </span>
          , {describePull(fit.pull)}
        </p>
      )}
      <p className={isOdd ? "font-semibold text-ember" : "text-pencil"}>{describeFit(fit)}</p>
    </div>
  );
}
