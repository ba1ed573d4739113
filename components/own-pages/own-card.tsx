import { AnchorMark } from "@/components/drawing/anchor-mark";
import { ShelterPlan } from "@/components/drawing/shelter-plan";
import { StateMark, stateWord } from "@/components/drawing/state-mark";
import { buildShelter } from "@/lib/calc/shelter-kinds";
import { findKnot } from "@/lib/domain/knots/knots";
import type { OwnCard, OwnStep } from "@/lib/domain/own-pages/views";
import { formatDayShort } from "@/lib/format/days";
import { joinWords } from "@/lib/format/words";

/** One shelter at one camp, step by step in the order of pitching. Opened by a touch, so that a phone shows one at a time. */
export function OwnPitchCard({ card, isOpen }: { readonly card: OwnCard; readonly isOpen: boolean }) {
  return (
    <details open={isOpen} className="group border-t border-hair">
      <summary className="flex min-h-14 list-none items-center justify-between gap-4 py-3 [&::-webkit-details-marker]:hidden">
        <span className="min-w-0">
          <span className="block text-18 font-bold">
            {card.campName}: {card.shelterName}
          </span>
          <span className="block text-15 text-pencil">{card.days.map(formatDayShort).join(", ")}</span>
        </span>
        <span className="text-15 font-semibold text-spruce group-open:hidden">Open</span>
        <span className="hidden text-15 font-semibold text-spruce group-open:block">Close</span>
      </summary>
      <div className="grid gap-x-10 gap-y-6 pb-8 lg:grid-cols-2">
        <div>
          <CardFacts card={card} />
          <div className="mt-4 rounded-sheet border border-hair bg-sheet p-2">
            <ShelterPlan
              model={buildShelter(card.spec)}
              headingDeg={card.headingDeg}
              wind={card.wind}
              marks={Object.fromEntries(
                card.steps.map((step) => [step.tieOutId, { verdict: step.verdict, anchor: step.anchor?.spec ?? null }]),
              )}
              sleeperNames={card.sleeperNames}
              width={560}
              height={460}
              label=""
            />
          </div>
        </div>
        <PitchSteps card={card} />
      </div>
    </details>
  );
}

function CardFacts({ card }: { readonly card: OwnCard }) {
  return (
    <dl className="grid grid-cols-[6rem_minmax(0,1fr)] gap-x-3 gap-y-1.5 text-15">
      <dt className="text-pencil">Holds to</dt>
      <dd>
        <span className="inline-flex items-center gap-2 font-bold">
          <StateMark verdict={card.verdict} isDecorative />
          {card.holdsTo}
        </span>
        <span className="block text-13 text-pencil">
          {stateWord(card.verdict)}, {card.holdsToRemark}
        </span>
      </dd>
      <dt className="text-pencil">Face</dt>
      <dd>
        <span className="font-bold">{card.facing}</span>, front at {Math.round(card.headingDeg)}°
        <span className="block text-13 text-pencil">{card.windWords}</span>
      </dd>
      <dt className="text-pencil">Ground</dt>
      <dd>{card.ground}</dd>
      <dt className="text-pencil">Sleep here</dt>
      <dd>{card.sleeperNames.length > 0 ? joinWords(card.sleeperNames) : "nobody yet"}</dd>
    </dl>
  );
}

function PitchSteps({ card }: { readonly card: OwnCard }) {
  return (
    <div>
      <p className="mb-1 text-15">
        Lay the shelter out, {card.facing}. Then peg it in this order; the numbers are those in the drawing.
      </p>
      <ol aria-label={`Order of pitching, ${card.shelterName} at ${card.campName}`}>
        {card.steps.map((step, index) => (
          <Step key={step.tieOutId} step={step} place={index + 1} />
        ))}
      </ol>
      {card.retension && <p className="mt-3 text-15">{card.retension}</p>}
      {card.fallbacks.length > 0 && (
        <div className="mt-5">
          <h3 className="mb-1 text-15 font-bold">Softer ground or stronger wind</h3>
          <ol className="list-decimal pl-5 text-15">
            {card.fallbacks.map((line) => (
              <li key={line}>{line}</li>
            ))}
          </ol>
        </div>
      )}
    </div>
  );
}

function Step({ step, place }: { readonly step: OwnStep; readonly place: number }) {
  const knot = step.knot && findKnot(step.knot);
  return (
    <li className="border-t border-hair py-3">
      <label className="flex min-h-12 items-start gap-3">
        <input
          type="checkbox"
          aria-label={`Done: step ${place}, tie-out ${step.number}`}
          className="mt-1 size-7 shrink-0 accent-spruce"
        />
        <span className="w-9 shrink-0 text-24 font-extrabold">{step.number}</span>
        <span className="min-w-0 flex-1">
          <span className="flex items-center gap-2 text-15 font-bold">
            {step.anchor ? <AnchorMark spec={step.anchor.spec} size={24} /> : null}
            {step.anchor?.name ?? "No anchor planned yet"}
          </span>
          <span className="block text-15">{[step.where, step.lean, step.line].filter(Boolean).join(" · ")}</span>
          {step.remarks.length > 0 && <span className="block text-15">{step.remarks.join("; ")}</span>}
        </span>
      </label>
      {knot && (
        <a
          href={`#knot-${knot.key}`}
          className="ml-10 inline-flex min-h-11 items-center text-15 font-semibold text-spruce hover:underline"
        >
          Knot: {knot.name}
          <span className="sr-only">, tie-out {step.number}</span>
        </a>
      )}
    </li>
  );
}
