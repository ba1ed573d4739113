import { act, fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeAll, beforeEach, describe, expect, test, vi } from "vitest";
import { StakingBoard } from "@/components/board/staking-board";
import { startBoardView } from "@/components/board/start-board-view";
import type { CalcClient } from "@/components/board/calc-client";
import type { PlanIntent } from "@/lib/domain/plan/schema";
import { METRIC } from "@/lib/domain/preferences";
import type { CampPlanView, PlanSaveResult } from "@/lib/domain/views";
import { CAMP_ID, makePitch, makeTray, makeView, place, USER_ID, WINDY_CAMP } from "./camp-fixture";

vi.mock("next/navigation", () => ({ useRouter: () => ({ refresh: vi.fn() }) }));

// Pitching a shelter otherwise is worked out in a worker of its own; here it would only slow every test down.
vi.mock("@/components/board/calc-client", async () => {
  const { runTask } = await import("@/components/board/calc-tasks");
  const run: CalcClient["run"] = async (name, input) => (name === "pitch-mends" ? [] : runTask(name, input)) as never;
  return { createCalcClient: (): CalcClient => ({ run, open: () => undefined, close: () => undefined }) };
});

const PITCH = makePitch("ridge-tarp", WINDY_CAMP);
const TRAY = makeTray();
const HOOK = "round-hook-180-kit0000000000";
const BLADE = "three-blade-200-kit0000000000";
const STORE_KEY = `leestead.plan.${CAMP_ID}.${USER_ID}`;

type Answer = (intents: readonly PlanIntent[], sent: number) => Response | Promise<Response>;

/** A plan route that says what it is told to and remembers what it was sent. */
function stubServer(answer: Answer) {
  const batches: PlanIntent[][] = [];
  vi.stubGlobal("fetch", async (_url: string, init: RequestInit) => {
    const { intents } = JSON.parse(String(init.body)) as { intents: PlanIntent[] };
    batches.push(intents);
    return answer(intents, batches.length);
  });
  return batches;
}

function saved(intents: readonly PlanIntent[], over: Partial<PlanSaveResult> = {}): Response {
  return Response.json({
    planVersion: 4,
    placements: intents.flatMap(({ change }) => (change.type === "place" ? [change.placement] : [])),
    savedAt: "2026-06-10T10:05:00.000Z",
    savedByName: "Rena Amsel",
    outcomes: intents.map(({ intentId }) => ({ intentId, outcome: "applied" })),
    ...over,
  } satisfies PlanSaveResult);
}

async function renderBoard(over: Partial<CampPlanView> = {}, camp = WINDY_CAMP) {
  const view = makeView({ pitches: [PITCH], tray: TRAY, ...over }, camp);
  const shown = render(<StakingBoard view={view} start={startBoardView(view)} preferences={METRIC} userId={USER_ID} />);
  // The calculation is loaded after the page; act waits for it.
  await act(() => import("@/components/board/engine"));
  return { view, ...shown };
}

const onPlan = () => screen.getByRole("group", { name: /from above/ });
const spotButton = (number: number) =>
  within(onPlan()).getByRole("button", { name: new RegExp(`^Tie-out ${number},`) });
const trayButton = (name: RegExp) =>
  within(screen.getByRole("region", { name: "Kit tray" }))
    .getAllByRole("button", { name })
    .find((button) => button.hasAttribute("aria-pressed")) ?? screen.getByText("no such piece in the tray");

beforeAll(() => {
  // jsdom has the element but not its methods.
  HTMLDialogElement.prototype.showModal = function showModal() {
    this.open = true;
  };
  HTMLDialogElement.prototype.close = function close() {
    this.open = false;
  };
});
beforeEach(() => {
  window.localStorage.clear();
  stubServer((intents) => saved(intents));
});
afterEach(() => {
  vi.unstubAllGlobals();
  vi.restoreAllMocks();
});

describe("without dragging", () => {
  test("a piece is picked up in the tray and put down on a tie-out by two taps", async () => {
    const user = userEvent.setup();
    await renderBoard();
    expect(spotButton(3)).toHaveAccessibleName(/no anchor, unknown/);
    await user.click(trayButton(/Round hook/));
    expect(trayButton(/Round hook/)).toHaveAttribute("aria-pressed", "true");
    await user.click(spotButton(3));
    expect(spotButton(3)).toHaveAccessibleName(/Round hook, 180 mm, (holds|thin|gives way), margin/);
    expect(trayButton(/Round hook/)).toHaveTextContent("3 of 4 left");
  });

  test("with a tie-out chosen, the tray puts a piece there by one tap", async () => {
    const user = userEvent.setup();
    await renderBoard();
    await user.click(spotButton(1));
    await user.click(screen.getByRole("button", { name: "Put Three-blade, 200 mm at tie-out 1" }));
    expect(spotButton(1)).toHaveAccessibleName(/Three-blade, 200 mm/);
  });

  test("moving by menu swaps the two tie-outs, and the tray takes an anchor back", async () => {
    const user = userEvent.setup();
    await renderBoard({
      placements: [place(PITCH, "ridge-front", HOOK), place(PITCH, "ridge-rear", BLADE)],
    });
    await user.click(spotButton(1));
    await user.selectOptions(screen.getByRole("combobox", { name: /^Move Round hook/ }), "ridge-rear");
    expect(spotButton(1)).toHaveAccessibleName(/Three-blade, 200 mm/);
    expect(spotButton(5)).toHaveAccessibleName(/Round hook/);
    await user.click(screen.getByRole("button", { name: "To the tray" }));
    expect(spotButton(1)).toHaveAccessibleName(/no anchor/);
  });
});

describe("by keyboard", () => {
  const press = async (code: string, target: Element | Document = document) => {
    fireEvent.keyDown(target, { code });
    await act(() => new Promise((resolve) => setTimeout(resolve, 60)));
  };

  beforeEach(() => {
    // jsdom lays nothing out: the places of the tie-outs on the drawing are read from their styles.
    vi.spyOn(Element.prototype, "getBoundingClientRect").mockImplementation(function rectOf(this: Element) {
      const { left, top } = this instanceof HTMLElement ? this.style : { left: "", top: "" };
      if (!left.endsWith("%")) return new DOMRect(2000, 2000, 40, 40);
      return new DOMRect(Number.parseFloat(left) * 7.6, Number.parseFloat(top) * 5.4, 40, 40);
    });
  });

  test("one arrow key goes one tie-out on, space puts the piece down, and names are said", async () => {
    await renderBoard();
    const piece = trayButton(/Wide sand/);
    piece.focus();
    await press("Space", piece);
    await press("ArrowRight");
    expect(screen.getByText(/^Wide sand stake, 300 mm is over tie-out 1, /)).toBeInTheDocument();
    expect(screen.getByText("This shelter would then")).toBeInTheDocument();
    await press("ArrowRight");
    expect(screen.getByText(/^Wide sand stake, 300 mm is over tie-out 2, /)).toBeInTheDocument();
    await press("Space");
    expect(screen.getByText(/^Wide sand stake, 300 mm was put down at tie-out 2, /)).toBeInTheDocument();
    expect(spotButton(1)).toHaveAccessibleName(/no anchor/);
    expect(spotButton(2)).toHaveAccessibleName(/Wide sand stake/);
  });

  test("escape leaves everything where it was", async () => {
    await renderBoard({ placements: [place(PITCH, "ridge-front", HOOK)] });
    spotButton(1).focus();
    await press("Space", spotButton(1));
    await press("ArrowRight");
    await press("Escape");
    expect(screen.getByText("Round hook, 180 mm stays where it was.")).toBeInTheDocument();
    expect(screen.getByText("This shelter")).toBeInTheDocument();
    expect(spotButton(1)).toHaveAccessibleName(/Round hook/);
  });
});

test("undo and redo walk through the changes, and each is sent as a small change", async () => {
  const user = userEvent.setup();
  const batches = stubServer((intents) => saved(intents));
  await renderBoard();
  expect(screen.getByRole("button", { name: "Undo" })).toBeDisabled();
  await user.click(trayButton(/Round hook/));
  await user.click(spotButton(2));
  await user.click(screen.getByRole("button", { name: "Undo" }));
  expect(spotButton(2)).toHaveAccessibleName(/no anchor/);
  await user.click(screen.getByRole("button", { name: "Redo" }));
  expect(spotButton(2)).toHaveAccessibleName(/Round hook/);
  await waitFor(() => expect(batches.flat().map((intent) => intent.change.type)).toEqual(["place", "lift", "place"]));
});

test("more of an anchor than there is: the plan stays and the reason is said", async () => {
  const user = userEvent.setup();
  const spots = ["ridge-front", "ridge-rear", "hem-left"];
  await renderBoard({ placements: spots.map((spot) => place(PITCH, spot, BLADE)) });
  await user.click(trayButton(/Three-blade, 200/));
  await user.click(spotButton(2));
  expect(screen.getByRole("alert")).toHaveTextContent("All 3 of Three-blade, 200 mm are placed. Lift one first.");
  expect(spotButton(2)).toHaveAccessibleName(/no anchor/);
});

describe("saving", () => {
  test("says when the plan was saved, in the trip's own time", async () => {
    const user = userEvent.setup();
    await renderBoard();
    expect(screen.getByText("saved 10:42")).toBeInTheDocument();
    await user.click(trayButton(/Round hook/));
    await user.click(spotButton(2));
    await waitFor(() => expect(screen.getByText("saved 11:05")).toBeInTheDocument());
  });

  test("without a connection the changes stay on this device, and go out on another try", async () => {
    const user = userEvent.setup();
    const batches = stubServer((intents, sent) => {
      if (sent === 1) throw new TypeError("no network");
      return saved(intents);
    });
    await renderBoard();
    await user.click(trayButton(/Round hook/));
    await user.click(spotButton(2));
    await screen.findByText("not saved: no connection, 1 change kept on this device");
    expect(JSON.parse(window.localStorage.getItem(STORE_KEY) ?? "[]")).toHaveLength(1);
    await user.click(screen.getByRole("button", { name: "Try again" }));
    await screen.findByText("saved 11:05");
    expect(batches[1]).toEqual(batches[0]);
    expect(window.localStorage.getItem(STORE_KEY)).toBeNull();
  });

  test("changes kept from another day are laid over the plan and sent with their own ids", async () => {
    const kept: PlanIntent = {
      intentId: "kept0000000000000000000001",
      baseVersion: 3,
      change: { type: "place", placement: place(PITCH, "ridge-front", HOOK) },
    };
    window.localStorage.setItem(STORE_KEY, JSON.stringify([kept]));
    const batches = stubServer((intents) => saved(intents));
    await renderBoard();
    await waitFor(() => expect(spotButton(1)).toHaveAccessibleName(/Round hook/));
    await waitFor(() => expect(batches).toEqual([[kept]]));
  });

  test("two people: who changed what is said, and mine can be kept on top of theirs", async () => {
    const user = userEvent.setup();
    const theirs = [place(PITCH, "ridge-front", BLADE)];
    const batches = stubServer((intents, sent) =>
      sent > 1
        ? saved(intents, { planVersion: 10 })
        : saved(intents, {
            planVersion: 9,
            placements: theirs,
            outcomes: intents.map(({ intentId }) => ({
              intentId,
              outcome: "conflict",
              by: "Tomi Oduya",
              at: "2026-06-10T10:01:00.000Z",
              changes: ["Tomi Oduya: Three-blade, 200 mm at tie-out 1"],
            })),
          }),
    );
    await renderBoard();
    await user.click(trayButton(/Round hook/));
    await user.click(spotButton(1));
    const dialog = await screen.findByRole("dialog", { name: "Tomi Oduya changed this plan too", hidden: true });
    expect(dialog).toHaveTextContent("Saved at 11:01");
    expect(dialog).toHaveTextContent("Three-blade, 200 mm at tie-out 1");
    await user.click(within(dialog).getByText("Keep mine"));
    await waitFor(() => expect(batches).toHaveLength(2));
    expect(batches[1]).toEqual([
      expect.objectContaining({
        baseVersion: 9,
        change: expect.objectContaining({ type: "place", placement: expect.objectContaining({ anchorId: HOOK }) }),
      }),
    ]);
  });

  test("taking theirs shows theirs, and mine can be had back by undo", async () => {
    const user = userEvent.setup();
    const theirs = [place(PITCH, "ridge-front", BLADE)];
    stubServer((intents) =>
      saved(intents, {
        planVersion: 9,
        placements: theirs,
        outcomes: intents.map(({ intentId }) => ({
          intentId,
          outcome: "conflict",
          by: "Tomi Oduya",
          at: "2026-06-10T10:01:00.000Z",
          changes: ["Tomi Oduya: changed it"],
        })),
      }),
    );
    await renderBoard();
    await user.click(trayButton(/Round hook/));
    await user.click(spotButton(1));
    const dialog = await screen.findByRole("dialog", { hidden: true });
    await user.click(within(dialog).getByText("Take theirs"));
    expect(spotButton(1)).toHaveAccessibleName(/Three-blade, 200/);
    await user.click(screen.getByRole("button", { name: "Undo" }));
    expect(spotButton(1)).toHaveAccessibleName(/Round hook/);
  });
});

describe("what is missing", () => {
  test("no wind: no number, the headline says so, and the place to enter it is linked", async () => {
    const camp = { ...WINDY_CAMP, wind: null };
    await renderBoard({ pitches: [makePitch("ridge-tarp", camp)] }, camp);
    expect(screen.getByRole("heading", { level: 2, name: "No gust yet" })).toBeInTheDocument();
    const gaps = screen.getByRole("list", { name: "What is missing" });
    expect(within(gaps).getAllByRole("link", { name: "Ground and wind" })[0]).toHaveAttribute(
      "href",
      expect.stringMatching(/\/place$/),
    );
    expect(within(onPlan()).queryByRole("button", { name: /margin/ })).toBeNull();
  });

  test("no kit: the tray says what belongs there", async () => {
    await renderBoard({ tray: [] });
    expect(screen.getByText("The tray is empty")).toBeInTheDocument();
    expect(screen.getByRole("link", { name: "Put together the kit" })).toHaveAttribute(
      "href",
      expect.stringMatching(/\/kit$/),
    );
  });
});

test("the proposal fills every tie-out as one change that can be undone", async () => {
  const user = userEvent.setup();
  await renderBoard();
  await user.click(screen.getByRole("button", { name: "Propose plan" }));
  await screen.findByText(/^Gave 8 of 8 tie-outs their anchor/);
  expect(within(onPlan()).queryByRole("button", { name: /no anchor/ })).toBeNull();
  await user.click(screen.getByRole("button", { name: "Undo" }));
  expect(within(onPlan()).getAllByRole("button", { name: /no anchor/ })).toHaveLength(8);
});
