import { render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { beforeAll, expect, test, vi } from "vitest";
import { SleepingBoard } from "@/components/sleepers/sleeping-board";
import { defaultShelterSpec } from "@/lib/calc/shelter-kinds";
import type { ActionState } from "@/lib/domain/action-state";
import type { SleepingPlanView } from "@/lib/domain/views";

const PEOPLE = ["Ada", "Bo", "Cleo"].map((name) => ({ id: `person-${name}`, name }));

const PLAN: SleepingPlanView = {
  campId: "camp1",
  campName: "Heron Flat",
  days: ["2027-06-12"],
  people: PEOPLE,
  pitches: [
    {
      id: "tarp",
      name: "Ridge tarp",
      sleeps: 1,
      sleeperIds: [],
      spec: defaultShelterSpec("ridge-tarp"),
      headingDeg: 0,
    },
    {
      id: "tent",
      name: "Ridge tent",
      sleeps: 2,
      sleeperIds: ["person-Cleo"],
      spec: defaultShelterSpec("ridge-tent"),
      headingDeg: 90,
    },
  ],
  outsideIds: [],
  unplacedIds: ["person-Ada", "person-Bo"],
};

const save = () =>
  vi.fn(async (_state: ActionState, _input: object): Promise<ActionState> => {
    return { status: "done", message: "", data: null };
  });
const place = (name: string) => screen.getByRole("region", { name });

/** jsdom lays nothing out: the places stand below each other, 100 px apart, so that arrow keys have somewhere to go. */
beforeAll(() => {
  vi.spyOn(HTMLElement.prototype, "getBoundingClientRect").mockImplementation(function (this: HTMLElement) {
    const sections = [...document.querySelectorAll("section")];
    const section = this.closest("section");
    const top = section ? sections.indexOf(section) * 100 : 0;
    return new DOMRect(0, top, 200, 90);
  });
});

test("by tap: pick a person, then a place", async () => {
  const action = save();
  render(<SleepingBoard plan={PLAN} tripId="trip1" action={action} />);
  await userEvent.click(screen.getByRole("button", { name: "Ada" }));
  await userEvent.click(within(place("Ridge tent")).getByRole("button", { name: "Put Ada here" }));
  expect(within(place("Ridge tent")).getByText("2 of 2 places, full")).toBeInTheDocument();
  expect(await screen.findByText(/^Saved \d\d:\d\d\.$/)).toBeInTheDocument();
  expect(action.mock.lastCall?.[1]).toEqual({
    tripId: "trip1",
    campId: "camp1",
    sleepers: [
      { personId: "person-Cleo", pitchId: "tent" },
      { personId: "person-Ada", pitchId: "tent" },
    ],
  });
});

test("by list: a full shelter is refused with its reason and nothing is saved", async () => {
  const action = save();
  render(<SleepingBoard plan={PLAN} tripId="trip1" action={action} />);
  await userEvent.selectOptions(screen.getByLabelText("Where Ada sleeps"), "tarp");
  action.mockClear();
  await userEvent.selectOptions(screen.getByLabelText("Where Bo sleeps"), "tarp");
  expect(screen.getByText("Ridge tarp is full: 1 of 1 places taken.")).toBeInTheDocument();
  expect(screen.getByLabelText("Where Bo sleeps")).toHaveValue("unplaced");
  expect(action).not.toHaveBeenCalled();
});

test("by keyboard: pick up, one place on, put down", async () => {
  const action = save();
  render(<SleepingBoard plan={PLAN} tripId="trip1" action={action} />);
  screen.getByRole("button", { name: "Drag Ada" }).focus();
  await userEvent.keyboard(" ");
  expect(await screen.findByText(/Ada picked up|Ada over/)).toBeInTheDocument();
  await vi.waitFor(() => expect(screen.getByText("Ada over Not placed yet.")).toBeInTheDocument());
  await userEvent.keyboard("{ArrowDown}");
  await vi.waitFor(() => expect(screen.getByText("Ada over Ridge tarp.")).toBeInTheDocument());
  await userEvent.keyboard(" ");
  await vi.waitFor(() => expect(within(place("Ridge tarp")).getByRole("button", { name: "Ada" })).toBeInTheDocument());
  expect(action).toHaveBeenCalledOnce();
});

test("fills free places, and undo brings the former arrangement back", async () => {
  const action = save();
  render(<SleepingBoard plan={PLAN} tripId="trip1" action={action} />);
  await userEvent.click(screen.getByRole("button", { name: "Fill free places" }));
  expect(within(place("Not placed yet")).getByText("Everybody has a place.")).toBeInTheDocument();
  await userEvent.click(screen.getByRole("button", { name: "Undo" }));
  expect(within(place("Not placed yet")).getByRole("button", { name: "Ada" })).toBeInTheDocument();
  await vi.waitFor(() =>
    expect(action.mock.lastCall?.[1]).toMatchObject({ sleepers: [{ personId: "person-Cleo", pitchId: "tent" }] }),
  );
});

test("says when it could not be saved and keeps the arrangement", async () => {
  const action = vi.fn(async (): Promise<ActionState> => Promise.reject(new Error("offline")));
  render(<SleepingBoard plan={PLAN} tripId="trip1" action={action} />);
  await userEvent.selectOptions(screen.getByLabelText("Where Ada sleeps"), "outside");
  expect(await screen.findByText(/Not saved\./)).toBeInTheDocument();
  expect(within(place("Outside, by choice")).getByRole("button", { name: "Ada" })).toBeInTheDocument();
  expect(screen.getByRole("button", { name: "Try again" })).toBeInTheDocument();
});
