import type { Gap } from "@/lib/calc/types";
import type { CampSummary } from "@/lib/domain/views";
import type { Preferences } from "@/lib/domain/preferences";
import { formatHoldsTo, formatSpeed } from "@/lib/format/speeds";
import { numberWord, startSentence } from "@/lib/format/words";

/** What a missing input is called behind "has" or "have". */
const MISSING: Readonly<Record<string, string>> = {
  "camp.gust": "no wind",
  "camp.exposure": "no exposure",
  "camp.altitude": "no altitude",
  "camp.ground": "no ground",
  "camp.secondGround": "no second ground",
  "camp.shelters": "no shelter",
  "camp.strongWindHours": "no hours of strong wind",
  "plan.anchors": "tie-outs without an anchor",
};

/** "no wind": behind "has". */
export function nameGap(gap: Gap): string {
  return MISSING[gap.field] ?? "something missing";
}

/** The first thing to enter, in the order in which one fills a camp in. */
function nameFirstGap(camp: CampSummary): string | null {
  const fields = Object.keys(MISSING).filter((field) => camp.gaps.some((gap) => gap.field === field));
  const [first] = fields;
  if (!first) return null;
  return first.startsWith("camp.") ? `${MISSING[first]} yet` : (MISSING[first] ?? null);
}

const countNights = (camps: readonly CampSummary[]) => camps.reduce((sum, camp) => sum + camp.days.length, 0);

interface Group {
  readonly camps: readonly CampSummary[];
  readonly one: string;
  readonly many: string;
}

function groupCamps(camps: readonly CampSummary[]): Group[] {
  const of = (verdict: CampSummary["verdict"]) => camps.filter((camp) => camp.verdict === verdict);
  const unknown = of("unknown");
  const reasons = new Set(unknown.map((camp) => nameFirstGap(camp)));
  const [reason] = reasons;
  const unknownWords =
    reasons.size === 1 && reason
      ? { one: `has ${reason}`, many: `have ${reason}` }
      : { one: "is not worked out yet", many: "are not worked out yet" };
  return [
    { camps: of("gives-way"), one: "gives way", many: "give way" },
    { camps: unknown, ...unknownWords },
    { camps: of("thin"), one: "is thin", many: "are thin" },
  ].filter((group) => group.camps.length > 0);
}

/** "One night gives way, one has no wind yet". */
export function writeHeadline(camps: readonly CampSummary[]): string {
  if (camps.length === 0) return "No camps yet";
  const groups = groupCamps(camps);
  const total = countNights(camps);
  if (groups.length === 0) return total === 1 ? "The night holds" : `All ${numberWord(total)} nights hold`;
  const parts = groups.map((group, index) => {
    const count = countNights(group.camps);
    const noun = index > 0 ? "" : count === 1 ? " night" : " nights";
    return `${numberWord(count)}${noun} ${count === 1 ? group.one : group.many}`;
  });
  return startSentence(parts.join(", "));
}

const MAX_NAMED = 4;

function describeCamp(camp: CampSummary, unit: Preferences["speedUnit"]): string {
  const planned = camp.designGustMs === null ? "" : ` in a planned gust of ${formatSpeed(camp.designGustMs, unit)}`;
  const limit = camp.holdsToGustMs === null ? null : formatHoldsTo(camp.holdsToGustMs, unit);
  if (camp.verdict === "gives-way") return `${camp.name} gives way${limit ? ` at ${limit}` : ""}${planned}.`;
  if (camp.verdict === "thin") return `${camp.name} is thin: sure to ${limit ?? "less"}${planned}.`;
  const missing = nameFirstGap(camp);
  return missing ? `${camp.name} has ${missing}.` : `${camp.name} is not worked out yet.`;
}

/** "Sill Ridge gives way at 62 km/h in a planned gust of 75 km/h. Low Barn has no wind yet. The other three hold." */
export function writeSubline(camps: readonly CampSummary[], unit: Preferences["speedUnit"]): string {
  if (camps.length === 0) return "Add the first camp. Its name is enough to begin.";
  const open = groupCamps(camps).flatMap((group) => group.camps);
  const holding = camps.filter((camp) => camp.verdict === "holds");
  if (open.length === 0) {
    const [least] = [...holding].sort((a, b) => spare(a) - spare(b));
    const isKnown = least && least.holdsToGustMs !== null && least.designGustMs !== null;
    if (!isKnown) return "Every tie-out holds in its planned gust.";
    const { name, holdsToGustMs, designGustMs } = least;
    return `The nearest to its limit is ${name}: it holds to ${formatHoldsTo(holdsToGustMs ?? 0, unit)} in a planned gust of ${formatSpeed(designGustMs ?? 0, unit)}.`;
  }
  const sentences = open.slice(0, MAX_NAMED).map((camp) => describeCamp(camp, unit));
  if (open.length > MAX_NAMED)
    sentences.push(`${startSentence(numberWord(open.length - MAX_NAMED))} more need a look.`);
  if (holding.length === 1) sentences.push(`${holding[0]?.name ?? "The other"} holds.`);
  if (holding.length > 1) sentences.push(`The other ${numberWord(holding.length)} hold.`);
  return sentences.join(" ");
}

const spare = (camp: CampSummary) => (camp.holdsToGustMs ?? Infinity) / (camp.designGustMs ?? 1);
