import type { z } from "zod";
import { requirePermission } from "@/lib/auth/permission";
import type { ConcernedView } from "@/lib/domain/people-views";
import { tripRefInput } from "@/lib/domain/trip/schema";
import type { Context } from "@/lib/services/context/context";
import { listOwnPagesStates } from "../own-pages/list-own-pages-states";
import { parseInput } from "../trips/parse-input";

/** "Skarn Edge, Ridge tarp, tie-out 3: …" begins with what changed; lines of the pack list do not. */
function subjectOf(change: string): string {
  const [head = "", rest] = change.split(":", 2);
  if (rest === undefined || /^(New|No longer|Bring|Carry|A night)\b/.test(head)) return "Pack lists and nights";
  return head.split(",")[0] ?? head;
}

/** Who was sent pages that say something else by now, and what changed for how many. */
export async function listConcerned({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<ConcernedView> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "post.send");
  const states = await listOwnPagesStates({ ctx, input: { tripId } });
  const people = states.flatMap(({ personId, name, copies }) => {
    const sent = copies.find((copy) => copy.way === "sent");
    return sent && sent.changes.length > 0 ? [{ personId, name, version: sent.version, changes: sent.changes }] : [];
  });
  const counts = new Map<string, Set<string>>();
  for (const { personId, changes } of people) {
    for (const change of changes) {
      const subject = subjectOf(change);
      counts.set(subject, (counts.get(subject) ?? new Set()).add(personId));
    }
  }
  const subjects = [...counts].map(([subject, ids]) => ({ subject, count: ids.size }));
  return { people, subjects: subjects.sort((a, b) => b.count - a.count || a.subject.localeCompare(b.subject, "en")) };
}
