import { CONTACTS, HEADER, PEOPLE } from "./fixture";
import { readPdf } from "./read-pdf";
import { describe, expect, it } from "vitest";
import type { ContactSheetView } from "@/lib/domain/people-views";
import { printable } from "@/lib/pdf/glyphs";
import { renderPaper } from "@/lib/pdf/render";

const person = (name: string, over: object = {}): ContactSheetView["people"][number] => ({
  id: name,
  name,
  role: "participant",
  email: "somebody@example.test",
  details: {
    phone: "+99 000 22 11",
    emergencyContacts: [{ name: `Kin of ${name}`, phone: "+99 000 33 44", relation: "sister" }],
    health: "Asthma: inhaler in the left pocket.\nBee stings.",
    diet: "No nuts.",
    ...over,
  },
});

const sheetOf = (people: ContactSheetView["people"]): ContactSheetView => ({
  people,
  contacts: CONTACTS,
  meetingPoints: "The bridge, on the hour.",
  wayOut: "Down the east burn to the road.",
  groupPhone: "+99 000 1",
});

const render = async (people: ContactSheetView["people"], size: "A4" | "LETTER" = "A4") =>
  readPdf(await renderPaper({ kind: "contact-sheet", header: HEADER, sheet: sheetOf(people) }, { size }));

const flat = (text: string) => text.replace(/\s+/g, "");

describe("the contact sheet on paper", () => {
  it.each(["A4", "LETTER"] as const)(
    "has everybody with numbers and notes, names in four scripts, on %s",
    async (size) => {
      const pdf = await render(
        PEOPLE.map((name) => person(name)),
        size,
      );
      const text = flat(pdf.text);
      for (const name of PEOPLE) expect(text).toContain(flat(printable(name)));
      for (const words of [
        "for leaders only",
        "+99 000 1",
        "The bridge",
        "Down the east burn",
        "Mountain rescue",
        "112",
      ]) {
        expect(text).toContain(flat(words));
      }
      expect(text.split(flat("Asthma: inhaler in the left pocket.")).length - 1).toBe(PEOPLE.length);
      expect(text.split(flat("+99 000 33 44")).length - 1).toBe(PEOPLE.length);
      const smallest = Math.min(...pdf.pages.flatMap((page) => page.items.map((item) => item.size)));
      expect(smallest).toBeGreaterThanOrEqual(9 - 0.01);
    },
  );

  it("says who has written nothing, and what can't be read", async () => {
    const silent = { ...person("Ada Moss"), details: null };
    const locked = { ...person("Bo Byr"), details: "unreadable" as const };
    const { text } = await render([silent, locked]);
    expect(flat(text)).toContain(flat("Has written nothing."));
    expect(flat(text)).toContain(flat("Can't be read with the keys"));
  });

  it("has no page with nothing but a line on it, however many there are", async () => {
    for (let count = 1; count <= 14; count += 1) {
      const silent = Array.from({ length: count }, (_, i) => ({ ...person(`Person ${i}`), details: null }));
      const { pages } = await render(silent);
      for (const page of pages) expect(flat(page.text), `${count} people`).toContain(flat("Has written nothing."));
    }
  });

  it("loses nothing of the longest notes and keeps inside the page, for 40 people and for none", async () => {
    const long = person("L".repeat(80), {
      health: Array.from({ length: 100 }, (_, i) => `note ${i}`)
        .join("\n")
        .slice(0, 2000),
      diet: "d".repeat(500),
    });
    const pdf = await render([...Array.from({ length: 39 }, (_, i) => person(`Person ${i}`)), long]);
    expect(flat(pdf.text)).toContain("note99");
    expect(flat(pdf.text)).toContain("Person38");
    for (const page of pdf.pages) {
      for (const item of page.items) {
        expect(item.x).toBeGreaterThanOrEqual(0);
        expect(item.x + item.width).toBeLessThanOrEqual(page.width);
        expect(item.baseline).toBeLessThanOrEqual(page.height);
      }
    }
    expect((await render([])).pages).toHaveLength(1);
  });
});
