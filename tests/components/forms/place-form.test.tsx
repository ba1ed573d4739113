import { render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { expect, test, vi } from "vitest";
import { PlaceForm } from "@/components/forms/place/place-form";
import type { ActionState } from "@/lib/domain/action-state";
import { blankCamp, HAZARDS } from "@/lib/domain/camp/schema";
import { readFormData } from "@/lib/domain/form-data";
import { METRIC } from "@/lib/domain/preferences";
import { readCampDetails } from "@/app/(app)/_forms/read-camp-details";

type Action = (state: ActionState, form: FormData) => Promise<ActionState>;

function renderForm(action: Action, details = blankCamp("Heron Flat")) {
  return render(
    <PlaceForm
      action={action}
      tripId="trip000000000000000000"
      campId="camp000000000000000000"
      version={3}
      details={details}
      hazards={HAZARDS}
      preferences={METRIC}
    />,
  );
}

const done: Action = () => Promise.resolve({ status: "done", message: "", data: null });

test("shows the signs of the chosen ground", async () => {
  renderForm(done);
  await userEvent.selectOptions(screen.getByLabelText("Kind of ground"), "moist-sandy-flat");
  expect(screen.getByText("thumb")).toBeInTheDocument();
  expect(screen.getByLabelText("How wet")).toBeInTheDocument();
});

test("what was typed stays when the answer is no, and the error stands at its field", async () => {
  const refuse: Action = () =>
    Promise.resolve({
      status: "refused",
      formError: "Look at the marked fields.",
      fieldErrors: { "details.altitudeM": ["The altitude has to be between -430 and 8850 m."] },
    });
  renderForm(refuse);
  const altitude = screen.getByLabelText("Altitude, m");
  await userEvent.type(altitude, "90000");
  await userEvent.type(screen.getByLabelText("Notes"), "Keep below the bank.");
  expect(screen.getByText("Not saved yet.")).toBeInTheDocument();
  await userEvent.click(screen.getByRole("button", { name: "Save ground and wind" }));
  expect(await screen.findByRole("alert")).toHaveTextContent("Look at the marked fields.");
  expect(screen.getByRole("alert")).toHaveFocus();
  expect(altitude).toHaveValue("90000");
  expect(altitude).toHaveAttribute("aria-invalid", "true");
  expect(altitude).toHaveAccessibleDescription(/between -430 and 8850/);
  expect(screen.getByLabelText("Notes")).toHaveValue("Keep below the bank.");
});

test("sends what was said, in SI, and null for what was not", async () => {
  const action = vi.fn(done);
  renderForm(action);
  await userEvent.selectOptions(screen.getByLabelText("Kind of ground"), "litter-over-loam");
  await userEvent.selectOptions(screen.getByLabelText("How wet"), "wet");
  await userEvent.type(screen.getByLabelText("Loose top layer, cm"), "6,5");
  await userEvent.click(screen.getByRole("radio", { name: /^Gust/ }));
  await userEvent.type(screen.getByLabelText("Gust"), "75");
  await userEvent.selectOptions(screen.getByLabelText("Unit"), "km/h");
  await userEvent.click(screen.getByRole("checkbox", { name: "A windbreak stands upwind" }));
  await userEvent.selectOptions(screen.getByLabelText("What it is"), "conifer-row");
  await userEvent.type(screen.getByLabelText("Its height, m"), "8");
  await userEvent.type(screen.getByLabelText("Distance to the shelters, m"), "40");
  await userEvent.click(screen.getByRole("checkbox", { name: "Tide" }));
  await userEvent.click(screen.getByRole("button", { name: "Save ground and wind" }));
  expect(await screen.findByText(/^Saved \d\d:\d\d\.$/)).toBeInTheDocument();

  const form = action.mock.calls[0]?.[1] ?? new FormData();
  const input = readFormData(form);
  expect(input.version).toBe(3);
  const details = readCampDetails(input);
  expect(details).toMatchObject({
    name: "Heron Flat",
    nights: 1,
    ground: { kind: "litter-over-loam", wetness: "wet", looseTopM: 0.065, stoneDepthM: null },
    secondGround: null,
    windbreak: { kind: "conifer-row", heightM: 8, distanceM: 40 },
    hill: null,
    hazards: ["tide"],
    altitudeM: null,
    exposure: null,
    hasTrees: false,
  });
  // 75 km/h = 75 · 1000 m / 3600 s
  expect(details.wind).toMatchObject({ kind: "gust" });
  expect(Reflect.get(Object(details.wind), "speedMs")).toBeCloseTo(20.8333, 4);
});

test("a cliff needs no lee slope; a hill without one is left for the schema to refuse", () => {
  const hill = { shape: "cliff", heightM: 30, upwindLengthM: 60, downwindLengthM: null, fromCrestM: 10 };
  const read = (shape: string) => readCampDetails({ hasHill: true, details: { hill: { ...hill, shape } } }).hill;
  expect(read("cliff")).toMatchObject({ downwindLengthM: 60 });
  expect(read("hill")).toMatchObject({ downwindLengthM: null });
});

test("after somebody else was first, mine can be saved over theirs", async () => {
  const action = vi.fn<Action>(() =>
    Promise.resolve({
      status: "refused",
      formError: "Rona changed Heron Flat on 9 June 18:20, after you opened it.",
      fieldErrors: { version: ["Rona changed Heron Flat on 9 June 18:20, after you opened it."] },
    }),
  );
  renderForm(action);
  await userEvent.type(screen.getByLabelText("Water"), "Spring.");
  await userEvent.click(screen.getByRole("button", { name: "Save ground and wind" }));
  expect(await screen.findByRole("alert")).toHaveTextContent("Rona changed Heron Flat");
  expect(screen.getByLabelText("Water")).toHaveValue("Spring.");
  await userEvent.click(screen.getByRole("button", { name: "Save mine over it" }));
  const form = action.mock.calls[1]?.[1] ?? new FormData();
  expect(readFormData(form)).toMatchObject({ keepMine: true });
});

test("every part can be reached from the top", () => {
  const { container } = renderForm(done);
  const parts = within(screen.getByRole("navigation", { name: "Parts of this page" })).getAllByRole("link");
  expect(parts).toHaveLength(6);
  for (const part of parts) expect(container.querySelector(part.getAttribute("href") ?? "none")).not.toBeNull();
});
