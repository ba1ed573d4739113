import { render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { describe, expect, it, vi } from "vitest";
import { CommentForm } from "@/components/comments/comment-form";
import { KnotCard } from "@/components/knots/knot-drawing";
import { CopyLine } from "@/components/own-pages/copy-line";
import { OwnPitchCard } from "@/components/own-pages/own-card";
import { defaultShelterSpec } from "@/lib/calc/shelter-kinds";
import { builtInAnchor } from "@/lib/calc/tables/anchors";
import { findKnot } from "@/lib/domain/knots/knots";
import type { OwnCard } from "@/lib/domain/own-pages/views";

vi.mock("next/navigation", () => ({ useRouter: () => ({ refresh: vi.fn() }) }));

const CARD: OwnCard = {
  campId: "camp",
  campName: "Otter Flat",
  days: ["2027-06-07"],
  pitchId: "pitch",
  shelterName: "Ridge tarp",
  spec: defaultShelterSpec("ridge-tarp"),
  headingDeg: 90,
  wind: { fromDeg: 250, toDeg: 290 },
  facing: "ridge E–W",
  windWords: "wind WSW to WNW",
  ground: "firm moist loam",
  verdict: "thin",
  holdsTo: "71 km/h",
  holdsToRemark: "planned 75 km/h",
  sleeperNames: ["Łucja Żółtowska"],
  steps: [
    {
      tieOutId: "ridge-front",
      number: 1,
      where: "Ridge end, front",
      anchor: { name: "Three-blade 200", spec: builtInAnchor("three-blade-200").spec },
      lean: "10° back",
      line: "line 1.9 m, 39° up",
      knot: "bowline",
      remarks: ["shock cord in the line"],
      verdict: "holds",
    },
    {
      tieOutId: "ridge-rear",
      number: 5,
      where: "Ridge end, rear",
      anchor: null,
      lean: "",
      line: "line 1.9 m, 39° up",
      knot: null,
      remarks: [],
      verdict: "unknown",
    },
  ],
  fallbacks: ["Tie-out 1: a rock on it."],
  retension: null,
};

describe("a shelter to pitch by", () => {
  it("says each step with its anchor, lean, line and the way to its knot", () => {
    render(<OwnPitchCard card={CARD} isOpen />);
    const steps = screen.getByRole("list", { name: "Order of pitching, Ridge tarp at Otter Flat" });
    const [first, second] = within(steps).getAllByRole("listitem");
    if (!first || !second) throw new Error("Steps are missing.");
    expect(first).toHaveTextContent("Three-blade 200");
    expect(first).toHaveTextContent("Ridge end, front · 10° back · line 1.9 m, 39° up");
    expect(within(first).getByRole("link", { name: "Knot: Bowline, tie-out 1" })).toHaveAttribute(
      "href",
      "#knot-bowline",
    );
    expect(second).toHaveTextContent("No anchor planned yet");
    expect(within(second).queryByRole("link")).toBeNull();
    expect(screen.getAllByText("Łucja Żółtowska").length).toBeGreaterThan(0);
  });
});

describe("a copy", () => {
  const copy = { way: "printed" as const, version: 3, at: "2027-06-01T10:00:00Z", changes: [] as string[] };

  it("is old when its pages changed, and still right when only others' did", () => {
    const { rerender } = render(<CopyLine copy={{ ...copy, changes: ["A night more."] }} version={5} timeZone="UTC" />);
    expect(screen.getByText(/Printed version 3, now 5/)).toHaveTextContent(/^Old\. /);
    rerender(<CopyLine copy={copy} version={5} timeZone="UTC" />);
    expect(screen.getByText(/Printed version 3, now 5/)).toHaveTextContent(/the paper is still right$/);
    rerender(<CopyLine copy={{ ...copy, version: 5 }} version={5} timeZone="UTC" />);
    expect(screen.getByText(/Printed version 5/)).toHaveTextContent(/Up to date$/);
  });
});

describe("a knot", () => {
  it("is a drawing with a name, its steps and what to look for", () => {
    const knot = findKnot("taut-line-hitch");
    if (!knot) throw new Error("There is no such knot.");
    render(<KnotCard knot={knot} />);
    expect(screen.getByRole("img", { name: "Taut-line hitch, drawn open" })).toBeInTheDocument();
    expect(screen.getAllByRole("listitem")).toHaveLength(knot.steps.length);
    expect(screen.getByText(knot.check)).toBeInTheDocument();
  });
});

describe("a comment", () => {
  it("takes names by a touch, sends an id of its own, and keeps what was typed when refused", async () => {
    const sent: FormData[] = [];
    const action = vi.fn((_: unknown, form: FormData) => {
      sent.push(form);
      return Promise.resolve({ status: "refused" as const, formError: "No.", fieldErrors: { body: ["Too long."] } });
    });
    render(
      <CommentForm
        action={action}
        tripId="trip"
        subject={{ about: "camp", campId: "camp" }}
        people={[{ id: "p", name: "Tobi Oduya" }]}
      />,
    );
    const user = userEvent.setup();
    await user.type(screen.getByLabelText("Comment"), "Wet there.");
    await user.click(screen.getByRole("button", { name: "@Tobi Oduya" }));
    await user.click(screen.getByRole("button", { name: "Write the comment" }));
    expect(await screen.findByText("Too long.")).toBeInTheDocument();
    expect(screen.getByLabelText("Comment")).toHaveValue("Wet there. @Tobi Oduya ");
    await user.click(screen.getByRole("button", { name: "Write the comment" }));
    const ids = sent.map((form) => form.get("commentId"));
    expect(ids).toHaveLength(2);
    expect(ids[0]).toMatch(/^[0-9a-z]{26}$/);
    expect(ids[1]).toBe(ids[0]);
  });
});
