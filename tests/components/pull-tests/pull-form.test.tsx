import { render, screen, waitFor } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { describe, expect, it, vi } from "vitest";
import { ComparePlot } from "@/components/pull-tests/compare-plot";
import { LearningCurve } from "@/components/pull-tests/learning-curve";
import { PullForm } from "@/components/pull-tests/pull-form";
import type { ComparedPull } from "@/lib/domain/pull-test/compare";
import type { GroundLearningView, PullTestView } from "@/lib/domain/pull-test/views";

const ANCHORS = [
  { id: "three-blade-200", name: "Three-blade, 200 mm" },
  { id: "v-160", name: "V, 160 mm" },
];
const START = {
  anchorId: "v-160",
  leanDeg: 20,
  lineAngleDeg: 45,
  depthOutM: 0,
  force: null,
  forceUnit: "kgf",
  outcome: null,
  wetness: "usual",
  note: "",
} as const;

describe("the form of a pull", () => {
  it("needs only the force and what happened when the set-up is the last one's, and keeps it for the next", async () => {
    const sent: FormData[] = [];
    const action = vi.fn(async (_state: unknown, form: FormData) => {
      sent.push(form);
      return { status: "done" as const, message: "Logged.", data: { pullTestId: String(form.get("pullTestId")) } };
    });
    const user = userEvent.setup();
    render(
      <PullForm action={action} values={{}} firstId="first00000000000000000000" anchors={ANCHORS} start={START} />,
    );
    await user.type(screen.getByLabelText("Highest reading"), "17,5");
    await user.click(screen.getByLabelText("Came out"));
    await user.click(screen.getByRole("button", { name: "Log this pull" }));
    await screen.findByText("Logged.");
    expect(Object.fromEntries(sent[0] ?? [])).toMatchObject({
      pullTestId: "first00000000000000000000",
      anchorId: "v-160",
      "reading.force:number": "17,5",
      "reading.outcome": "came-out",
      "reading.leanDeg:number": "20",
    });
    await waitFor(() => expect(screen.getByLabelText<HTMLInputElement>("Highest reading").value).toBe(""));
    expect(screen.getByLabelText<HTMLInputElement>("Came out").checked).toBe(false);
    expect(screen.getByLabelText<HTMLSelectElement>("Anchor").value).toBe("v-160");
    await user.type(screen.getByLabelText("Highest reading"), "18");
    await user.click(screen.getByRole("button", { name: "Log this pull" }));
    await waitFor(() => expect(sent).toHaveLength(2));
    expect(sent[1]?.get("pullTestId")).not.toBe("first00000000000000000000");
  });

  it("keeps everything that was typed when the answer is no", async () => {
    const action = async () => ({
      status: "refused" as const,
      formError: "Look at the marked fields.",
      fieldErrors: { "reading.force": ["The force has to be above 0."] },
    });
    const user = userEvent.setup();
    render(
      <PullForm action={action} values={{}} firstId="first00000000000000000000" anchors={ANCHORS} start={START} />,
    );
    await user.type(screen.getByLabelText("Highest reading"), "0");
    await user.click(screen.getByRole("button", { name: "Log this pull" }));
    await screen.findByText("The force has to be above 0.");
    expect(screen.getByLabelText<HTMLInputElement>("Highest reading").value).toBe("0");
  });
});

const curve = Array.from({ length: 41 }, (_, i) => {
  const logFactor = (i - 20) / 20;
  return { logFactor, before: Math.exp(-2 * logFactor ** 2), after: 2 * Math.exp(-8 * logFactor ** 2) };
});
const view: GroundLearningView = {
  kind: "firm-moist-loam",
  groundName: "Firm moist loam",
  from: "own",
  ownCount: 2,
  elsewhereCount: 0,
  placeCount: 0,
  factor: 1.2,
  lowFactor: 0.9,
  highFactor: 1.6,
  dependableFactor: 1.3,
  scatter: 0.3,
  tableScatter: 0.4,
  curve,
};

function reading(id: string, fit: PullTestView["fit"]): PullTestView {
  return { id, fit } as PullTestView;
}

describe("the pictures", () => {
  it("of a ground say their numbers in words, and draw a disc, an arrow and a ring", () => {
    const counts = { status: "counts", groundMedianN: 100, pull: 1, chance: 0.5 } as const;
    const { container } = render(
      <LearningCurve
        view={view}
        readings={[
          reading("a", { ...counts, kind: "exact", ratio: 1.1, isOutlier: false }),
          reading("b", { ...counts, kind: "at-least", ratio: 1.3, isOutlier: false }),
          reading("c", { ...counts, kind: "exact", ratio: 0.5, isOutlier: true }),
          reading("d", { status: "says-nothing" }),
        ]}
      />,
    );
    expect(screen.getByRole("img").textContent).toMatch(
      /1\.2\u2009×, nine of ten chances between 0\.90\u2009× and 1\.6\u2009×/,
    );
    expect(container.querySelectorAll("circle")).toHaveLength(3);
  });

  it("of the comparison draw each reading once, those that held as arrows, on logarithmic axes", () => {
    const pull = (id: string, measuredN: number, outcome: ComparedPull["outcome"]): ComparedPull => ({
      id,
      anchorName: "V",
      groundName: "Peat",
      leanDeg: 0,
      lineAngleDeg: 45,
      outcome,
      measuredN,
      predictedN: 100,
      kind: outcome === "came-out" || outcome === "bent" ? "exact" : "at-least",
    });
    const { container } = render(
      <ComparePlot
        forceUnit="N"
        pulls={[pull("a", 50, "came-out"), pull("b", 100, "bent"), pull("c", 200, "still-holding")]}
      />,
    );
    const [disc] = container.querySelectorAll("circle");
    const [square] = container.querySelectorAll("rect");
    const y = { half: Number(disc?.getAttribute("cy")), same: Number(square?.getAttribute("y")) + 4 };
    const arrow = [...container.querySelectorAll("path")].find((path) => path.getAttribute("d")?.includes("v-15"));
    const double = Number(/^M[\d.]+ ([\d.]+)h8/.exec(arrow?.getAttribute("d") ?? "")?.[1]);
    // Half and double are equally far from the same.
    expect(y.half - y.same).toBeCloseTo(y.same - double, 6);
    expect(container.innerHTML).not.toMatch(/NaN/);
  });
});
