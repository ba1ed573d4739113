import { readFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { ACTION_ROWS, CALLERS, PAGE_ROWS, ROUTE_ROWS } from "../../e2e/role-matrix";
import { listExports, listFiles, listRoutes } from "./list-routes";

const listed = listRoutes();
const namesOf = (rows: readonly { readonly name: string }[]) => [...new Set(rows.map((row) => row.name))].sort();

describe("the role matrix", () => {
  it.each([
    ["pages", listed.pages, PAGE_ROWS],
    ["route handlers", listed.routes, ROUTE_ROWS],
    ["server actions", listed.actions, ACTION_ROWS],
  ])("has a row for each of the %s, and none for what is not there", (_, found, rows) => {
    expect(found.length).toBeGreaterThan(5);
    expect(namesOf(rows)).toEqual([...found].sort());
  });

  it("says in each row what each caller gets, and names no case twice", () => {
    for (const rows of [PAGE_ROWS, ROUTE_ROWS, ACTION_ROWS]) {
      const cases = rows.map((row) => `${row.name} ${row.when ?? ""}`);
      expect(new Set(cases).size).toBe(cases.length);
      for (const row of rows) expect(Object.keys(row.outcome).sort()).toEqual([...CALLERS].sort());
    }
  });

  it("gives nobody without a session anything of a trip, and strangers nothing but what a missing trip gives", () => {
    const ofTrips = [...PAGE_ROWS, ...ROUTE_ROWS, ...ACTION_ROWS].filter((row) => row.name.includes("[tripId]"));
    expect(ofTrips.length).toBeGreaterThan(40);
    for (const { name, outcome } of ofTrips) {
      expect(outcome.nobody, name).toMatch(/^(sign-in|signed-out)$/);
      expect(outcome.stranger, name).toBe("not-found");
      expect(outcome.otherLeader, name).toBe("not-found");
      expect(outcome.leader, name).toBe("allowed");
    }
  });
});

describe("what is listed", () => {
  it("covers everything by which the framework can be reached", () => {
    // The icon is one file, the same for everybody.
    expect(listed.others).toEqual(["icon.svg"]);
    expect(listed.routes.every((route) => !route.includes("*"))).toBe(true);
    expect(listed.actions.every((action) => !action.endsWith("#*"))).toBe(true);
  });

  it("has every server action: they are in app/**/actions.ts and nowhere else", () => {
    const found = ["app", "components", "lib"].flatMap((folder) =>
      listFiles(path.join(process.cwd(), folder))
        .filter((file) => /\.tsx?$/.test(file))
        .map((file) => `${folder}/${file}`)
        .filter((file) => /^\s*["']use server["']/m.test(readFileSync(file, "utf8"))),
    );
    expect(found.filter((file) => !/^app\/.*\/actions\.ts$/.test(file))).toEqual([]);
    expect(found.length).toBeGreaterThan(5);
  });

  it("sees each way to export", () => {
    const source = [
      "export const GET = 1, POST = 2;",
      "export async function PATCH() {}",
      "const x = 3;",
      "export { x as PUT };",
      "export * from './other';",
      "export default x;",
      "export type Hidden = string;",
    ].join("\n");
    expect(listExports("x.ts", source)).toEqual(["GET", "POST", "PATCH", "PUT", "*", "default"]);
  });
});
