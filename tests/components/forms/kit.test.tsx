import { render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { expect, test, vi } from "vitest";
import { readKitItemDetails } from "@/app/(app)/_forms/read-kit-details";
import { CountStepper, type SaveCount } from "@/components/kit/count-stepper";
import { KitItemForm } from "@/components/kit/kit-item-form";
import type { ActionState } from "@/lib/domain/action-state";
import { readFormData } from "@/lib/domain/form-data";
import { kitItemDetailsSchema } from "@/lib/domain/kit/schema";

const ids = { tripId: "trip1", kitItemId: "item1" };

test("several presses are saved as one count on the version that was shown", async () => {
  const action = vi.fn<SaveCount>(async () => ({ status: "done", message: "Saved.", data: { version: 8 } }));
  render(<CountStepper name="V section" count={2} version={7} ids={ids} action={action} />);
  const more = screen.getByRole("button", { name: "One more V section" });
  await userEvent.click(more);
  await userEvent.click(more);
  expect(screen.getByText("4")).toBeInTheDocument();
  expect(await screen.findByText("Saved.")).toBeInTheDocument();
  expect(action).toHaveBeenCalledOnce();
  expect(action.mock.lastCall?.[1]).toEqual({ ...ids, count: 4, version: 7 });
});

test("a refused count goes back and says why", async () => {
  const reason = "3 of them are placed at Heron Flat. Lift some first.";
  const action = vi.fn<SaveCount>(async () => ({ status: "refused", formError: reason, fieldErrors: {} }));
  render(<CountStepper name="V section" count={3} version={7} ids={ids} action={action} />);
  await userEvent.click(screen.getByRole("button", { name: "One fewer V section" }));
  expect(await screen.findByText(reason)).toBeInTheDocument();
  expect(screen.getByText("3")).toBeInTheDocument();
});

test("never below zero", () => {
  render(<CountStepper name="V section" count={0} version={1} ids={ids} action={vi.fn<SaveCount>()} />);
  expect(screen.getByRole("button", { name: "One fewer V section" })).toBeDisabled();
});

test("an own stake is asked for what its section has, and arrives in SI", async () => {
  const action = vi.fn(async (_state: ActionState, _form: FormData): Promise<ActionState> => ({
    status: "done",
    message: "",
    data: null,
  }));
  render(<KitItemForm action={action} details={null} values={{ tripId: "trip1" }} saveLabel="Add" />);
  await userEvent.type(screen.getByLabelText("Name"), "Old wide stake");
  await userEvent.selectOptions(screen.getByLabelText("Section"), "wide");
  expect(screen.queryByLabelText("Blade, from the middle, mm")).not.toBeInTheDocument();
  await userEvent.type(screen.getByLabelText("Length in the ground, mm"), "310");
  await userEvent.type(screen.getByLabelText("Width, mm"), "48");
  await userEvent.type(screen.getByLabelText("Depth of the curve, mm"), "9");
  await userEvent.type(screen.getByLabelText("Thickness, mm"), "1,5");
  await userEvent.type(screen.getByLabelText("Mass of one, g"), "34");
  await userEvent.type(screen.getByLabelText("How many"), "2");
  await userEvent.click(screen.getByRole("button", { name: "Add" }));
  await vi.waitFor(() => expect(action).toHaveBeenCalledOnce());
  const form = action.mock.lastCall?.[1] ?? new FormData();
  const details = kitItemDetailsSchema.parse(readKitItemDetails(readFormData(form).details));
  expect(details).toMatchObject({ type: "anchor", name: "Old wide stake", massKg: 0.034, count: 2 });
  const spec = details.type === "anchor" ? details.spec : null;
  expect(spec).toMatchObject({ class: "stake", lengthM: 0.31, headRatingN: null });
  const section = spec?.class === "stake" ? spec.section : null;
  expect(section).toMatchObject({ shape: "wide", widthM: 0.048, thicknessM: 0.0015 });
});
