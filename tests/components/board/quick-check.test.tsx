import { fireEvent, render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { beforeEach, describe, expect, test } from "vitest";
import { readCheck, runCheck, writeCheck } from "@/components/quick-check/check-state";
import { QuickCheck } from "@/components/quick-check/quick-check";
import { METRIC } from "@/lib/domain/preferences";
import { formatForce } from "@/lib/format/forces";

const renderCheck = (query: Record<string, string> = {}) => {
  const initial = readCheck(query);
  render(<QuickCheck initial={initial} preferences={METRIC} />);
  return initial;
};
const answer = () => screen.getAllByRole("heading", { level: 2 })[0];

beforeEach(() => window.history.replaceState(null, "", "/quick-check"));

describe("the address", () => {
  test("keeps what is asked, there and back", () => {
    const check = readCheck({ anchor: "v-160", ground: "peat", wetness: "wet", line: "30", lean: "20" });
    expect(readCheck(Object.fromEntries(new URLSearchParams(writeCheck(check))))).toEqual(check);
  });

  test.each([{ anchor: "nonsense" }, { line: "91" }, { lean: "NaN" }, { ground: "" }])(
    "%o falls back on the first example",
    (query) => expect(readCheck(query)).toEqual(readCheck({})),
  );
});

test("says what it holds, by the calculation that everything else uses, and shows the working", () => {
  const capacity = runCheck(renderCheck());
  expect(capacity.status).toBe("ok");
  if (capacity.status !== "ok") return;
  expect(answer()).toHaveTextContent(`holds ${formatForce(capacity.dependableN)}`, { normalizeWhitespace: false });
  const working = screen.getByRole("table", { name: "How this was calculated" });
  expect(within(working).getAllByRole("rowheader")).toHaveLength(capacity.workings.length);
});

test("follows a slider and keeps it in the address", () => {
  const initial = renderCheck();
  fireEvent.change(screen.getByRole("slider", { name: /^Line above the ground/ }), { target: { value: "15" } });
  const capacity = runCheck({ ...initial, lineAngleDeg: 15 });
  if (capacity.status !== "ok") throw new Error("the first example can be used");
  expect(answer()).toHaveTextContent(`holds ${formatForce(capacity.dependableN)}`, { normalizeWhitespace: false });
  expect(new URLSearchParams(window.location.search).get("line")).toBe("15");
});

test("a stake on rock can't be used: no number, a reason and what to use instead", async () => {
  const user = userEvent.setup();
  renderCheck();
  await user.selectOptions(screen.getByRole("combobox", { name: "Ground" }), "rock-slab");
  expect(answer()).toHaveTextContent("can't be used here");
  expect(screen.getByText(/Use instead:/)).toBeInTheDocument();
  expect(screen.queryByText(/holds \d/)).toBeNull();
});

test("both plots have the same numbers as tables", () => {
  renderCheck();
  expect(screen.getByRole("img", { name: /against its lean/ })).toBeInTheDocument();
  expect(screen.getByRole("img", { name: /angle of its line/ })).toBeInTheDocument();
  expect(screen.getAllByText("The same as a table")).toHaveLength(2);
});
