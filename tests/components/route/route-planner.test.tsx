import { fireEvent, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { beforeEach, describe, expect, it, vi } from "vitest";
import { RoutePlanner } from "@/components/route/route-planner";
import { PositionEntry } from "@/components/forms/place/position-entry";
import { BLANK_SETTINGS } from "@/lib/domain/route/schema";
import type { RouteView } from "@/lib/domain/route/views";

const evening = { light: "usual" as const, sunsetMin: 20 * 60, duskMin: 20 * 60 + 40 };
const stopOf = (campId: string, name: string, atM: number | null) => ({
  campId,
  name,
  version: 3,
  days: ["2026-09-14"],
  latitude: 60,
  longitude: 8,
  altitudeM: 300,
  atM,
  leg: null,
});

/** Twenty level kilometres with two camps on them. */
const VIEW: RouteView = {
  tripId: "trip00000000000000000001",
  line: {
    name: "Way",
    source: "file",
    pointCount: 2,
    lengthM: 20_000,
    breaks: [],
    simplified: [
      [
        [60, 8, 0],
        [60.18, 8, 20_000],
      ],
    ],
    profile: { lengthM: 20_000, stepM: 25, heightsM: Array<number>(801).fill(300) },
    places: [],
    remarks: [],
  },
  stops: [
    stopOf("camp00000000000000000001", "Otterbed", 5000),
    stopOf("camp00000000000000000002", "High Moss", 15_000),
  ],
  homeDay: "2026-09-16",
  homeLeg: null,
  evenings: [evening, evening, evening],
  settings: { ...BLANK_SETTINGS, rule: "naismith", setOffMinute: 18 * 60 },
  settingsVersion: 1,
};

const done = { status: "done" as const, message: "", data: null };
const action = vi.fn(async (_state: unknown, _placing: object) => done);
beforeEach(() => action.mockClear());
const show = (view = VIEW) => render(<RoutePlanner route={view} unit="m" placeAction={action} />);
const slider = (name: string) => screen.getByRole("slider", { name: `${name}, place along the way` });

describe("camps along the profile", () => {
  it("are moved with the arrow keys and saved with Enter; the days follow before that", async () => {
    const user = userEvent.setup();
    show();
    expect(screen.getAllByText("5.0 km")).toHaveLength(2);
    slider("Otterbed").focus();
    await user.keyboard("{Shift>}{ArrowRight}{/Shift}{ArrowRight}");
    expect(slider("Otterbed")).toHaveAttribute("aria-valuenow", "6100");
    expect(screen.getByText("6.1 km")).toBeInTheDocument();
    expect(action).not.toHaveBeenCalled();
    await user.keyboard("{Enter}");
    expect(action.mock.calls[0]?.[1]).toEqual({
      tripId: VIEW.tripId,
      campId: "camp00000000000000000001",
      version: 3,
      atM: 6100,
      position: "line",
    });
  });

  it("go back with Escape, and are not saved", async () => {
    const user = userEvent.setup();
    show();
    slider("Otterbed").focus();
    await user.keyboard("{ArrowRight}{Escape}");
    expect(slider("Otterbed")).toHaveAttribute("aria-valuenow", "5000");
    await user.tab();
    expect(action).not.toHaveBeenCalled();
  });

  it("stay between their neighbours", async () => {
    const user = userEvent.setup();
    show();
    slider("Otterbed").focus();
    await user.keyboard("{End}");
    expect(slider("Otterbed")).toHaveAttribute("aria-valuenow", "15000");
    await user.keyboard("{ArrowRight}");
    expect(slider("Otterbed")).toHaveAttribute("aria-valuenow", "15000");
  });

  it("can be put back where they were", async () => {
    const user = userEvent.setup();
    show();
    slider("High Moss").focus();
    await user.keyboard("{PageUp}{Enter}");
    await user.click(await screen.findByRole("button", { name: "Put High Moss back" }));
    expect(action.mock.calls[1]?.[1]).toMatchObject({
      atM: 15_000,
      position: { latitude: 60, longitude: 8, altitudeM: 300 },
    });
  });

  it("come to where the profile is tapped, once they are selected", () => {
    show();
    fireEvent.pointerUp(screen.getByRole("group", { name: /Profile of the way/ }), { clientX: 300 });
    expect(action).not.toHaveBeenCalled();
    fireEvent.focus(slider("Otterbed"));
    fireEvent.pointerUp(screen.getByRole("group", { name: /Profile of the way/ }), { clientX: 300 });
    // 760 px wide, 46 and 14 px beside the axis: (300 − 46)/700 of 20 km.
    expect(action.mock.calls[0]?.[1]).toMatchObject({ atM: (254 / 700) * 20_000 });
  });

  it("that are not on the line have a button that puts them there", async () => {
    const user = userEvent.setup();
    show({ ...VIEW, stops: [stopOf("camp00000000000000000001", "Otterbed", null), ...VIEW.stops.slice(1)] });
    await user.click(screen.getByRole("button", { name: "Place Otterbed" }));
    expect(action.mock.calls[0]?.[1]).toMatchObject({ atM: 7500 });
  });

  it("say how the day ends: light left, or in the dark by how much", () => {
    show();
    // Naismith: 5 km in 1 h, from 18:00; dark at 20:40. The next leg of 10 km arrives at 20:00.
    expect(screen.getByText("Pitching begins 100 min before dark.")).toBeInTheDocument();
    expect(screen.getByText("Pitching begins 40 min before dark.")).toBeInTheDocument();
  });

  it("in the dark", () => {
    show({ ...VIEW, settings: { ...VIEW.settings, setOffMinute: 19 * 60 + 5 } });
    expect(screen.getByText("In the dark by 25 min.")).toBeInTheDocument();
  });

  it("without a time of setting off there is no arrival, and it says so", () => {
    show({ ...VIEW, settings: { ...VIEW.settings, setOffMinute: null } });
    expect(screen.getAllByText("No arrival yet: when you set off missing.").length).toBe(3);
  });
});

describe("a position from a map", () => {
  it("is read on Enter without sending the form around it, or refused with a reason", async () => {
    const user = userEvent.setup();
    const onFound = vi.fn();
    const onSubmit = vi.fn();
    render(
      <form onSubmit={onSubmit}>
        <PositionEntry onFound={onFound} />
      </form>,
    );
    const field = screen.getByLabelText("From a map or device");
    await user.type(field, "32T LR 34200 77664{Enter}");
    expect(onFound.mock.calls[0]?.[0].latitude).toBeCloseTo(45.8326, 4);
    expect(screen.getByRole("status")).toHaveTextContent("Read as a grid reference");
    await user.clear(field);
    await user.type(field, "99, 0{Enter}");
    expect(screen.getByRole("status")).toHaveTextContent("between 90° south and 90° north");
    expect(onFound).toHaveBeenCalledTimes(1);
    expect(onSubmit).not.toHaveBeenCalled();
  });
});
