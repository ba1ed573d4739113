import { quickMends } from "@/lib/calc/mend";
import type { Gap, Mend } from "@/lib/calc/types";
import type { CampSummary, TodoItem } from "@/lib/domain/views";
import type { Preferences } from "@/lib/domain/preferences";
import { formatHoldsTo } from "@/lib/format/speeds";
import { joinWords, plural } from "@/lib/format/words";
import type { WorkedCamp } from "../analysis/work-out-camp";
import type { CampState } from "../plan/load-trip-state";
import { nameGap } from "./overview-words";

export interface OverviewCamp {
  readonly state: CampState;
  readonly worked: WorkedCamp;
  readonly summary: CampSummary;
}

/** Mends cost a search; the same worked camp is asked again at every look at the trip. */
const mendsOf = new WeakMap<WorkedCamp, Mend | null>();

function findBestMend(worked: WorkedCamp): Mend | null {
  const known = mendsOf.get(worked);
  if (known !== undefined) return known;
  const [best] = worked.result.weakest ? quickMends(worked.input, worked.result.weakest) : [];
  mendsOf.set(worked, best ?? null);
  return best ?? null;
}

function describeWeakNight(
  { summary, worked }: OverviewCamp,
  base: string,
  unit: Preferences["speedUnit"],
): TodoItem[] {
  if (summary.verdict !== "gives-way" && summary.verdict !== "thin") return [];
  const { weakest, shelters } = worked.result;
  const shelter = shelters.find((one) => one.pitchId === weakest?.pitchId);
  const tieOut = shelter?.tieOuts.find((one) => one.tieOutId === weakest?.tieOutId);
  const mend = findBestMend(worked);
  return [
    {
      tone: summary.verdict,
      title:
        shelter && tieOut
          ? `${summary.name}, ${shelter.name}: tie-out ${tieOut.number}`
          : `${summary.name} does not hold`,
      action: mend
        ? `${mend.title} → ${formatHoldsTo(mend.holdsToGustMs, unit)}`
        : "Look for another pitch or another anchor",
      href: `${base}/camps/${summary.id}`,
    },
  ];
}

function describeMissing(camp: OverviewCamp, base: string): TodoItem[] {
  const { summary, state } = camp;
  const page = `${base}/camps/${summary.id}`;
  const place: readonly Gap[] = summary.gaps.filter(
    (gap) => gap.field.startsWith("camp.") && gap.field !== "camp.shelters",
  );
  const items: TodoItem[] = [];
  const [first] = place;
  if (first) {
    items.push({
      tone: "unknown",
      title: `${summary.name} has ${joinWords(place.map((gap) => nameGap(gap)))} yet`,
      action: place.length === 1 ? first.message : "Fill in its ground and wind",
      href: `${page}/place`,
    });
  }
  if (state.pitches.length === 0) {
    items.push({
      tone: "unknown",
      title: `${summary.name} has no shelter yet`,
      action: "Pitch a shelter there",
      href: `${page}/shelters`,
    });
  }
  return [...items, ...describeBareTieOuts(camp, base)];
}

/** Tie-outs without an anchor: the kit is short when there are more of them than anchors left. */
function describeBareTieOuts({ summary, state, worked }: OverviewCamp, base: string): TodoItem[] {
  const bare = worked.result.shelters
    .flatMap((shelter) => shelter.tieOuts)
    .filter((one) => one.placement === null).length;
  if (bare === 0) return [];
  const left = Object.values(worked.result.left).reduce((sum, count) => sum + count, 0);
  const isShort = left < bare;
  return [
    {
      tone: "unknown",
      title: isShort
        ? `Kit: ${plural(bare - left, "anchor")} short at ${summary.name}`
        : `${plural(bare, "tie-out")} at ${summary.name} without an anchor`,
      action: isShort ? "Add to the kit" : state.placements.length === 0 ? "Propose a plan" : "Finish the plan",
      href: isShort ? `${base}/kit` : `${base}/camps/${summary.id}`,
    },
  ];
}

function describeUnplaced({ summary, state }: OverviewCamp, base: string, peopleCount: number): TodoItem[] {
  const unplaced = peopleCount - state.sleepers.length;
  if (state.pitches.length === 0 || unplaced <= 0) return [];
  return [
    {
      tone: "people",
      title: `${plural(unplaced, "person has", "people have")} no place at ${summary.name}`,
      action: "Place them",
      href: `${base}/camps/${summary.id}/shelters`,
    },
  ];
}

export interface PeopleStanding {
  readonly total: number;
  /** Invited, no answer, link still open or expired. */
  readonly unanswered: number;
  readonly uninvited: number;
}

function describePeople({ total, unanswered, uninvited }: PeopleStanding, base: string): TodoItem[] {
  const items: TodoItem[] = [];
  const href = `${base}/people`;
  if (unanswered > 0) {
    items.push({
      tone: "people",
      title: `${unanswered} of ${total} ${unanswered === 1 ? "has" : "have"} not answered`,
      action: "Remind them",
      href,
    });
  }
  if (uninvited > 0) {
    items.push({
      tone: "people",
      title: `${plural(uninvited, "person is", "people are")} not invited yet`,
      action: "Invite them",
      href,
    });
  }
  return items;
}

/** What to do before the trip, worst first. */
export function listTodo(
  tripId: string,
  camps: readonly OverviewCamp[],
  people: PeopleStanding,
  unit: Preferences["speedUnit"],
): TodoItem[] {
  const base = `/trips/${tripId}`;
  const weak = camps.flatMap((camp) => describeWeakNight(camp, base, unit));
  return [
    ...weak.filter((item) => item.tone === "gives-way"),
    ...camps.flatMap((camp) => describeMissing(camp, base)),
    ...weak.filter((item) => item.tone === "thin"),
    ...camps.flatMap((camp) => describeUnplaced(camp, base, people.total)),
    ...describePeople(people, base),
  ];
}
