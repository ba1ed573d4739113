import { render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { describe, expect, test } from "vitest";
import { AnchorMark } from "@/components/drawing/anchor-mark";
import { layoutPlan } from "@/components/drawing/plan-layout";
import { ShelterElevation } from "@/components/drawing/shelter-elevation";
import { ShelterPlan } from "@/components/drawing/shelter-plan";
import { StateMark } from "@/components/drawing/state-mark";
import { WindDial } from "@/components/drawing/wind-dial";
import { buildShelter, defaultShelterSpec, SHELTER_KINDS } from "@/lib/calc/shelter-kinds";

const SIZE = { width: 720, height: 520 };
const WIND = { fromDeg: 270, toDeg: 315 };
const build = (kind: (typeof SHELTER_KINDS)[number]["kind"]) => buildShelter(defaultShelterSpec(kind));
const apart = (a: readonly [number, number], b: readonly [number, number]) => Math.hypot(a[0] - b[0], a[1] - b[1]);

describe.each(SHELTER_KINDS.map((kind) => kind.kind))("%s in plan", (kind) => {
  const model = build(kind);
  const layout = layoutPlan({ model, headingDeg: 25, upDeg: 0, wind: WIND, ...SIZE });

  test("distances on the sheet are distances on the ground times one scale", () => {
    for (const a of model.tieOuts) {
      for (const b of model.tieOuts) {
        const onGround = Math.hypot(a.anchor.x - b.anchor.x, a.anchor.y - b.anchor.y);
        const spotOf = (id: string) => layout.tieOuts.find((one) => one.tieOutId === id)?.anchor ?? [NaN, NaN];
        expect(apart(spotOf(a.id), spotOf(b.id))).toBeCloseTo(onGround * layout.fit.scale, 6);
      }
    }
    expect(layout.scale.length / layout.scale.lengthM).toBeCloseTo(layout.fit.scale, 6);
  });

  test.each([SIZE, { width: 350, height: 350 }])("everything stays on a sheet of $width", (size) => {
    const small = layoutPlan({ model, headingDeg: 25, upDeg: 0, wind: WIND, ...size });
    const points = [
      ...small.tieOuts.flatMap((one) => [one.anchor, one.state, one.numberAt]),
      ...small.windArrows.flatMap((arrow) => [arrow.tail, arrow.head]),
      small.north,
      small.scale.at,
    ];
    for (const [x, y] of points) {
      expect(x).toBeGreaterThan(0);
      expect(x).toBeLessThan(size.width);
      expect(y).toBeGreaterThan(0);
      expect(y).toBeLessThan(size.height);
    }
  });

  test("no two tie-outs are labelled on the same spot", () => {
    layout.tieOuts.forEach((one, index) => {
      for (const other of layout.tieOuts.slice(index + 1)) expect(apart(one.state, other.state)).toBeGreaterThan(12);
    });
  });

  test("draws every number once", () => {
    const { container } = render(<ShelterPlan model={model} headingDeg={0} wind={WIND} label="From above" />);
    const numbers = [...container.querySelectorAll("text")].map((text) => text.textContent);
    for (const tieOut of model.tieOuts)
      expect(numbers.filter((text) => text === String(tieOut.number))).toHaveLength(1);
    expect(screen.getByRole("img", { name: "From above" })).toBeInTheDocument();
  });

  test("has an elevation with its height", () => {
    render(<ShelterElevation model={model} label="From the front" />);
    expect(screen.getByRole("img", { name: "From the front" })).toHaveTextContent(/\d\.\d+\sm/);
  });
});

test("heading turns the drawing: with the front to the east, what was at the top is at the right", () => {
  const model = build("ridge-tarp");
  const at = (headingDeg: number, upDeg = 0) => {
    const layout = layoutPlan({ model, headingDeg, upDeg, wind: null, ...SIZE });
    const front = layout.tieOuts.find((one) => one.tieOutId === "ridge-front")?.anchor ?? [NaN, NaN];
    const middle = layout.fit.place(layout.view.middle);
    return [Math.sign(Math.round(front[0] - middle[0])), Math.sign(Math.round(front[1] - middle[1]))];
  };
  expect(at(0)).toEqual([0, -1]);
  expect(at(90)).toEqual([1, 0]);
  expect(at(90, 90)).toEqual([0, -1]);
});

test("the wind arrows come from where the wind comes from and point at the shelter", () => {
  const model = build("dome");
  const layout = layoutPlan({ model, headingDeg: 0, upDeg: 0, wind: { fromDeg: 270, toDeg: 270 }, ...SIZE });
  const [arrow] = layout.windArrows;
  const middle = layout.fit.place(layout.view.middle);
  expect(layout.windArrows).toHaveLength(1);
  expect(arrow?.tail[0]).toBeLessThan(arrow?.head[0] ?? 0);
  expect(arrow?.head[0]).toBeLessThan(middle[0]);
  expect(arrow?.tail[1]).toBeCloseTo(middle[1], 6);
});

describe("marks carry words", () => {
  test.each([
    ["holds", "holds"],
    ["thin", "thin"],
    ["gives-way", "gives way"],
    ["unknown", "unknown"],
  ] as const)("%s", (verdict, word) => {
    render(<StateMark verdict={verdict} />);
    expect(screen.getByRole("img", { name: word })).toBeInTheDocument();
  });

  test("an anchor is named by its section, unless its name stands beside it", () => {
    const spec = { class: "natural", kind: "tree", checked: true } as const;
    const { rerender } = render(<AnchorMark spec={spec} isDecorative={false} />);
    expect(screen.getByRole("img", { name: "tree" })).toBeInTheDocument();
    rerender(<AnchorMark spec={spec} />);
    expect(screen.queryByRole("img")).toBeNull();
  });
});

describe("wind dial", () => {
  const hidden = (container: HTMLElement) =>
    ["details.windFromDeg:number", "details.windToDeg:number"].map(
      (name) => container.querySelector<HTMLInputElement>(`input[name="${name}"]`)?.value,
    );

  test("sends the two ends of the range, and nothing when it may come from anywhere", async () => {
    const user = userEvent.setup();
    const { container } = render(<WindDial fromDeg={270} toDeg={315} />);
    expect(hidden(container)).toEqual(["270", "315"]);
    await user.click(screen.getByRole("checkbox", { name: "It may come from anywhere" }));
    expect(hidden(container)).toEqual(["", ""]);
  });

  test("hands are moved by arrow keys and by typing", async () => {
    const user = userEvent.setup();
    const { container } = render(<WindDial fromDeg={355} toDeg={45} />);
    screen.getByRole("slider", { name: "Wind from" }).focus();
    await user.keyboard("{ArrowRight}");
    expect(hidden(container)).toEqual(["0", "45"]);
    expect(screen.getByRole("slider", { name: "Wind from" })).toHaveAttribute("aria-valuetext", "0°, N");
    await user.clear(screen.getByRole("spinbutton", { name: "Clockwise to, °" }));
    await user.type(screen.getByRole("spinbutton", { name: "Clockwise to, °" }), "90");
    expect(hidden(container)).toEqual(["0", "90"]);
  });
});
