import type { KnotId } from "@/lib/calc/types";
import { LARKS_HEAD, PRUSIK, SLIPPERY_HALF_HITCH } from "./shapes/bights";
import {
  ANCHOR_BEND,
  CLOVE_HITCH,
  ROUND_TURN_TWO_HALF_HITCHES,
  TAUT_LINE_HITCH,
  TWO_HALF_HITCHES,
} from "./shapes/hitches";
import { BOWLINE, FIGURE_EIGHT_LOOP, SHEET_BEND } from "./shapes/loops";
import { SIBERIAN_HITCH, TIMBER_HITCH, TRUCKERS_HITCH } from "./shapes/slipped";
import type { KnotShape } from "./types";

export type KnotKey = KnotId | "slippery-half-hitch" | "larks-head" | "prusik" | "siberian-hitch";

export interface Knot {
  readonly key: KnotKey;
  readonly name: string;
  /** What it is for at a shelter. */
  readonly use: string;
  readonly steps: readonly string[];
  /** How to tell that it is right, and what goes wrong. */
  readonly check: string;
  readonly shape: KnotShape;
}

/** Knots of the trade in our own drawings and words. Order: those a tie-out can have first, by how often they are used. */
export const KNOT_GUIDE: readonly Knot[] = [
  {
    key: "bowline",
    name: "Bowline",
    use: "A loop that keeps its size: on a stake, or on a corner of the shelter.",
    steps: [
      "Make a small loop in the line, the part towards the end on top.",
      "Bring the end up through the small loop, from behind.",
      "Take it round behind the part that takes the load.",
      "Put it back down through the small loop, beside where it came up.",
      "Hold the end and its neighbour together and pull the load part tight.",
    ],
    check:
      "The end lies inside the large loop, as long as a hand is wide. It can shake loose while slack: pull it tight.",
    shape: BOWLINE,
  },
  {
    key: "taut-line-hitch",
    name: "Taut-line hitch",
    use: "A line you want to tighten later: it slides by hand and grips under load.",
    steps: [
      "Take the end round the stake and back beside the load part.",
      "Wind it twice round the load part, inside the loop, each turn nearer the stake.",
      "Bring the end over both turns, out of the loop.",
      "Make one half hitch round the load part beyond the turns, the same way round.",
      "Draw it snug, then slide the whole knot to tighten the line.",
    ],
    check: "Two turns inside, one outside. It slips on slick or icy cord: use a trucker's hitch there.",
    shape: TAUT_LINE_HITCH,
  },
  {
    key: "two-half-hitches",
    name: "Two half hitches",
    use: "Tying a line off at a stake, a ring or a tree.",
    steps: [
      "Take the end round the anchor.",
      "Cross it over the load part, round behind it, and out through the loop you made.",
      "Do the same again below, going round the same way.",
      "Push both up together and pull tight.",
    ],
    check: "Both hitches turn the same way: they look like a clove hitch on the line itself.",
    shape: TWO_HALF_HITCHES,
  },
  {
    key: "round-turn-two-half-hitches",
    name: "Round turn and two half hitches",
    use: "The same with a heavy load: the extra turn takes the pull while you tie.",
    steps: [
      "Take the end round the anchor twice, the turns side by side.",
      "Cross it over the load part, round behind it, and out through the loop.",
      "Make a second half hitch below, going round the same way.",
      "Push both up to the anchor and pull tight.",
    ],
    check: "Two full turns lie on the anchor and do not cross.",
    shape: ROUND_TURN_TWO_HALF_HITCHES,
  },
  {
    key: "clove-hitch",
    name: "Clove hitch",
    use: "A quick hold on a pole or a stake with pull from both sides.",
    steps: [
      "Take the end round the pole.",
      "Cross it over its own first turn and round the pole again, the same way.",
      "Tuck the end under the crossing turn.",
      "Pull both parts apart.",
    ],
    check:
      "One turn crosses over; both parts come out beneath it, in opposite directions. It can roll loose: add a half hitch.",
    shape: CLOVE_HITCH,
  },
  {
    key: "timber-hitch",
    name: "Timber hitch",
    use: "A log or a buried bundle as an anchor. Holds only while it is pulled.",
    steps: [
      "Take the end round the log.",
      "Take it round the load part.",
      "Wind it at least three times round its own turn, along the log.",
      "Pull the load part so that the turns are jammed against the log.",
    ],
    check: "The end winds round its own turn, not round the load part. Keep it under load.",
    shape: TIMBER_HITCH,
  },
  {
    key: "anchor-bend",
    name: "Anchor bend",
    use: "A lasting hold on a ring or a stake with a hole.",
    steps: [
      "Take the end round the ring twice.",
      "Cross it over the load part, and back under both turns on the ring.",
      "Pull that snug.",
      "Make a half hitch round the load part.",
    ],
    check: "The end goes under both turns, between them and the ring.",
    shape: ANCHOR_BEND,
  },
  {
    key: "truckers-hitch",
    name: "Trucker's hitch",
    use: "A ridge line or a main guy that has to be very tight.",
    steps: [
      "Make a loop in the line and pull a bight of the slack part through it: a loop that slips open later.",
      "Take the end round the anchor.",
      "Bring it up through that loop and pull down hard: the loop works like a pulley.",
      "Hold the bend with your fingers and make it fast with two half hitches below the loop.",
    ],
    check: "The loop is made from the slack part, so it does not pull out under load.",
    shape: TRUCKERS_HITCH,
  },
  {
    key: "figure-eight-loop",
    name: "Figure-eight loop",
    use: "A loop that never shakes loose, to clip or to drop over a stake.",
    steps: [
      "Double the line as long as the loop needs.",
      "With the doubled line make a turn: across itself, then round behind.",
      "Put the doubled end through the first turn, from the front.",
      "Lay the strands side by side and pull all four tight.",
    ],
    check: "Two strands run side by side through the whole figure. Hard to undo after a heavy load.",
    shape: FIGURE_EIGHT_LOOP,
  },
  {
    key: "sheet-bend",
    name: "Sheet bend",
    use: "Joining two lines, also of different thickness, or a line to a bunched corner of cloth.",
    steps: [
      "Bend the thicker line back on itself.",
      "Bring the other up through the bend, from behind.",
      "Take it round behind both parts of the bend, the short one first.",
      "Tuck it under itself, across the bend, and pull tight.",
    ],
    check: "Both short ends come out on the same side. Go round twice with thin or slick cord.",
    shape: SHEET_BEND,
  },
  {
    key: "slippery-half-hitch",
    name: "Slippery half hitch",
    use: "Making a line fast so that one pull frees it, with cold hands.",
    steps: [
      "Take the end round the anchor and across the load part.",
      "Bend the end double and bring the bend round behind the load part, out through the loop.",
      "Pull the bend snug and leave the end hanging free.",
      "Pull the end to undo.",
    ],
    check: "A bight, not the end, goes through the loop.",
    shape: SLIPPERY_HALF_HITCH,
  },
  {
    key: "siberian-hitch",
    name: "Siberian hitch",
    use: "A ridge line at the first tree: quick with gloves, and one pull frees it.",
    steps: [
      "Take the end round the tree.",
      "Lay the end in a loop and give the loop a twist, so that it crosses itself.",
      "Bring the end over the load part, round behind it.",
      "Pull a bight of the end through the twisted loop.",
      "Draw it snug and slide it up to the tree. Pull the end to undo.",
    ],
    check: "The end passes over the load part and its bight comes back under it.",
    shape: SIBERIAN_HITCH,
  },
  {
    key: "larks-head",
    name: "Lark's head",
    use: "A loop of cord on a ring, a pole or a tie-out, without a free end.",
    steps: [
      "Bring the bend of the loop behind the pole and out below.",
      "Put both parts of the cord through the bend.",
      "Pull them evenly.",
    ],
    check: "Both parts come out together beneath the bend. It slips when only one of them is pulled.",
    shape: LARKS_HEAD,
  },
  {
    key: "prusik",
    name: "Prusik",
    use: "A loop that grips a ridge line and slides when slack: for the ends of a tarp.",
    steps: [
      "Take thinner cord, tied to a loop, and make a lark's head on the line.",
      "Pass the loop round and through once more, inside the first turns.",
      "Lay the turns side by side and pull snug.",
      "Slide it by pushing the turns, never by the loop.",
    ],
    check: "Four turns side by side under the bend, none crossed. Cord at most two thirds as thick as the line.",
    shape: PRUSIK,
  },
];

export function findKnot(key: KnotKey): Knot | undefined {
  return KNOT_GUIDE.find((knot) => knot.key === key);
}
