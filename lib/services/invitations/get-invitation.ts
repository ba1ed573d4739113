import { and, eq } from "drizzle-orm";
import { z } from "zod";
import { getDb } from "@/db/client";
import { user } from "@/db/schema";
import { invitationTokenSchema } from "@/lib/domain/person/schema";
import type { OwnAnswerView } from "@/lib/domain/people-views";
import { AppError } from "@/lib/errors";
import { formatDayRange } from "@/lib/format/days";
import { findLastDay, toOwnAnswer } from "../answers/internal";
import { loadTripRow } from "../trips/internal";
import { loadOpenInvitation } from "./internal";

const getInvitationInput = z.object({ token: invitationTokenSchema });

export interface InvitationView {
  readonly tripName: string;
  readonly personName: string;
  readonly email: string;
  readonly hasAccount: boolean;
  /** "12–18 June" */
  readonly dates: string;
  readonly own: OwnAnswerView;
}

/** For whoever holds the link; they need no account. */
export async function getInvitation({ input }: { input: z.input<typeof getInvitationInput> }): Promise<InvitationView> {
  const parsed = getInvitationInput.safeParse(input);
  if (!parsed.success) throw new AppError("not-found", "This is not a link of an invitation.");
  const row = await loadOpenInvitation(getDb(), parsed.data.token);
  const [account] = await getDb()
    .select({ id: user.id })
    .from(user)
    .where(and(eq(user.email, row.person.email), eq(user.emailVerified, true)));
  const trip = await loadTripRow(getDb(), row.person.tripId);
  return {
    tripName: row.tripName,
    personName: row.person.name,
    email: row.person.email,
    hasAccount: account !== undefined,
    dates: formatDayRange(trip.startDate, await findLastDay(getDb(), trip)),
    own: await toOwnAnswer(getDb(), trip, row.person),
  };
}
