import { and, asc, eq, inArray, type SQL } from "drizzle-orm";
import { comment, person } from "@/db/schema";
import type { CommentSubject } from "@/lib/domain/comment/schema";
import { PERMISSIONS } from "@/lib/domain/permissions/permissions";
import { loadCampRow } from "../camps/internal";
import { loadShelterRow } from "../shelters/internal";
import type { Reader } from "../trips/internal";

/** The camp or shelter on this trip that a comment is about, with its own page. */
export async function loadSubject(
  reader: Reader,
  tripId: string,
  subject: CommentSubject,
): Promise<{ readonly name: string; readonly path: string; readonly where: SQL | undefined }> {
  const base = `/trips/${tripId}`;
  if (subject.about === "camp") {
    const { name } = await loadCampRow(reader, tripId, subject.campId);
    const where = and(eq(comment.campId, subject.campId), eq(comment.tripId, tripId));
    return { name, path: `${base}/camps/${subject.campId}/comments`, where };
  }
  const { name } = await loadShelterRow(reader, tripId, subject.shelterId);
  const where = and(eq(comment.shelterId, subject.shelterId), eq(comment.tripId, tripId));
  return { name, path: `${base}/shelters/${subject.shelterId}`, where };
}

/** Those on the trip who may read comments. */
export async function listReaders(reader: Reader, tripId: string) {
  return reader
    .select({ id: person.id, name: person.name, email: person.email, userId: person.userId })
    .from(person)
    .where(and(eq(person.tripId, tripId), inArray(person.role, [...PERMISSIONS["comment.read"].roles])))
    .orderBy(asc(person.name), asc(person.id));
}
