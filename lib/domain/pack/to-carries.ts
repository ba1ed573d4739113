import type { z } from "zod";
import type { LoadShareView } from "./load-view";
import type { carrySaveInput } from "./schema";

type Carry = z.input<typeof carrySaveInput>["carries"][number];

/** Shares as they are saved. */
export function toCarries(shares: readonly LoadShareView[]): Carry[] {
  return shares.flatMap(({ key, personId, count, isFixed }): Carry[] => {
    const [what, id = ""] = key.split(":");
    switch (what) {
      case "kit":
        return [{ type: "kit", personId, kitItemId: id, count, isFixed }];
      case "thing":
        return [{ type: "thing", personId, thingId: id, isFixed }];
      case "fly":
      case "poles":
        return [{ type: "shelter", personId, shelterId: id, part: what, isFixed }];
      case "shelter":
        return [{ type: "shelter", personId, shelterId: id, part: null, isFixed }];
      default:
        return [];
    }
  });
}
