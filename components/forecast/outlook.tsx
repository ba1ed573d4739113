import { StateMark } from "@/components/drawing/state-mark";
import type { OutlookSide, OutlookView } from "@/lib/domain/forecast/views";
import type { Preferences } from "@/lib/domain/preferences";
import { formatHoldsTo, formatSpeed } from "@/lib/format/speeds";
import { gustWords } from "../results/verdict-words";

type SpeedUnit = Preferences["speedUnit"];

function describeSide({ verdict, designGustMs, holdsToGustMs }: OutlookSide, unit: SpeedUnit): string {
  const planned = designGustMs === null ? "no gust planned" : `gust ${formatSpeed(designGustMs, unit)}`;
  if (holdsToGustMs === null) return planned;
  if (verdict === "gives-way") return `${planned}, gives way at ${formatHoldsTo(holdsToGustMs, unit)}`;
  return `${planned}, holds to ${gustWords(holdsToGustMs, unit)}`;
}

/** "Skarn Edge now gives way: was holds", and both sides in numbers. */
export function Outlook({ outlook, unit }: { readonly outlook: OutlookView; readonly unit: SpeedUnit }) {
  const { sentence, isWorse, before, after } = outlook;
  return (
    <div className={`border-l-4 py-1 pl-4 ${isWorse ? "border-rowan" : "border-hair"}`}>
      <p className={`text-18 font-bold ${isWorse ? "text-rowan" : ""}`}>{sentence}.</p>
      <dl className="mt-1 grid grid-cols-[6.5rem_minmax(0,1fr)] gap-x-3 gap-y-1 text-15">
        {(
          [
            ["As planned", before],
            ["With this", after],
          ] as const
        ).map(([label, side]) => (
          <div key={label} className="contents">
            <dt className="text-pencil">{label}</dt>
            <dd className="flex items-baseline gap-2">
              <StateMark verdict={side.verdict} size={15} className="translate-y-[2px]" />
              <span>{describeSide(side, unit)}</span>
            </dd>
          </div>
        ))}
      </dl>
    </div>
  );
}
