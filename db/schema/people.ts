import { index, integer, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import type { AnswerValue } from "@/lib/domain/answer/schema";
import type { OverdueStep } from "@/lib/domain/emergency/schema";
import { flag, idColumn, instant, versionColumn } from "./columns";
import { person, trip } from "./trip";

const tripKey = () =>
  text("trip_id")
    .primaryKey()
    .references(() => trip.id, { onDelete: "cascade" });
const tripRef = () =>
  text("trip_id")
    .notNull()
    .references(() => trip.id, { onDelete: "cascade" });
const personRef = () =>
  text("person_id")
    .notNull()
    .references(() => person.id, { onDelete: "cascade" });

/** How people answer on a trip. No row: no limit, no deadline, the usual times. */
export const roster = sqliteTable("roster", {
  tripId: tripKey(),
  /** Places, leaders included; null: no limit. */
  capacity: integer("capacity"),
  /** Last day for an answer, yyyy-mm-dd, in the trip's time zone. */
  answerBy: text("answer_by"),
  /** Days before `answerBy` on which who has not answered gets a reminder; null: none. */
  remindDaysBefore: integer("remind_days_before"),
  /** Days after the trip's last day on which people's own details are deleted. */
  keepDetailsDays: integer("keep_details_days").notNull(),
  version: versionColumn(),
  updatedAt: instant("updated_at").notNull(),
});

export const answer = sqliteTable(
  "answer",
  {
    personId: text("person_id")
      .primaryKey()
      .references(() => person.id, { onDelete: "cascade" }),
    tripId: tripRef(),
    value: text("value").$type<AnswerValue>().notNull(),
    note: text("note").notNull().default(""),
    /** Said yes while the trip was full. */
    isWaiting: flag("is_waiting").notNull().default(false),
    /** Since when they say so; the waiting list is in this order. */
    answeredAt: instant("answered_at").notNull(),
  },
  (table) => [index("answer_trip").on(table.tripId, table.answeredAt)],
);

/** What somebody wrote about themselves: contact, emergency contacts, health, diet. Never in the clear. */
export const personalDetail = sqliteTable(
  "personal_detail",
  {
    id: idColumn(),
    tripId: tripRef(),
    personId: personRef(),
    /** "key id.nonce.tag.ciphertext", AES-256-GCM, bound to this row's id, person and trip. */
    sealed: text("sealed").notNull(),
    consentText: text("consent_text").notNull(),
    consentAt: instant("consent_at").notNull(),
    version: versionColumn(),
    updatedAt: instant("updated_at").notNull(),
  },
  (table) => [uniqueIndex("personal_detail_person").on(table.personId), index("personal_detail_trip").on(table.tripId)],
);

/** What happens when the group is not back in time. One per trip. */
export const emergencyPlan = sqliteTable("emergency_plan", {
  tripId: tripKey(),
  meetingPoints: text("meeting_points").notNull().default(""),
  wayOut: text("way_out").notNull().default(""),
  groupPhone: text("group_phone").notNull().default(""),
  dueBackAt: instant("due_back_at"),
  outsideName: text("outside_name").notNull().default(""),
  outsideEmail: text("outside_email").notNull().default(""),
  outsidePhone: text("outside_phone").notNull().default(""),
  steps: text("steps", { mode: "json" }).$type<OverdueStep[]>().notNull().default([]),
  version: versionColumn(),
  /** The version that the contact outside has, and since when. */
  sentVersion: integer("sent_version"),
  sentAt: instant("sent_at"),
  backAt: instant("back_at"),
  updatedAt: instant("updated_at").notNull(),
});

/** Something that happened, for one person's next digest. */
export const notice = sqliteTable(
  "notice",
  {
    id: idColumn(),
    tripId: tripRef(),
    personId: personRef(),
    sentence: text("sentence").notNull(),
    createdAt: instant("created_at").notNull(),
    sentAt: instant("sent_at"),
  },
  (table) => [index("notice_open").on(table.sentAt, table.createdAt), index("notice_person").on(table.personId)],
);
