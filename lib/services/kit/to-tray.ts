import { BUILT_IN_ANCHORS } from "@/lib/calc/tables/anchors";
import type { AnchorSpec, TrayAnchor } from "@/lib/calc/types";
import type { CampDetails } from "@/lib/domain/camp/schema";
import type { KitRow } from "./internal";

type Found = Pick<CampDetails, "hasRocks" | "hasTrees" | "hasSticks">;

/** How many of each found thing a group can reckon with at a camp that has them: judgement. */
const FOUND_THINGS: Readonly<Record<string, { readonly needs: keyof Found; readonly count: number }>> = {
  "rock-20": { needs: "hasRocks", count: 8 },
  "rock-40": { needs: "hasRocks", count: 4 },
  "sticks-buried": { needs: "hasSticks", count: 6 },
  "log-buried": { needs: "hasSticks", count: 2 },
  tree: { needs: "hasTrees", count: 4 },
};

function listFoundAnchors(camp: Found): TrayAnchor[] {
  return BUILT_IN_ANCHORS.flatMap((anchor): TrayAnchor[] => {
    const rule = anchor.found ? FOUND_THINGS[anchor.id] : undefined;
    if (!rule || !camp[rule.needs]) return [];
    const { id, name } = anchor;
    // Whoever says that a camp has trees to tie to has looked at them; the form says what to look for.
    const spec: AnchorSpec = anchor.spec.class === "natural" ? { ...anchor.spec, checked: true } : anchor.spec;
    return [{ id, name, spec, count: rule.count, massKg: 0, found: true }];
  });
}

export function listFoundAnchorIds(camp: Found): ReadonlySet<string> {
  return new Set(listFoundAnchors(camp).map((anchor) => anchor.id));
}

/** What can be set at a camp: the kit's anchors, then what is found there. */
export function toTray(kit: readonly KitRow[], camp: Found): TrayAnchor[] {
  const carried = kit.flatMap(({ id, details }): TrayAnchor[] =>
    details.type === "anchor"
      ? [{ id, name: details.name, spec: details.spec, count: details.count, massKg: details.massKg, found: false }]
      : [],
  );
  return [...carried, ...listFoundAnchors(camp)];
}

export function countShockCords(kit: readonly KitRow[]): number {
  return kit.reduce((sum, { details }) => sum + (details.type === "shock-cord" ? details.count : 0), 0);
}
