import { index, integer, sqliteTable, text } from "drizzle-orm/sqlite-core";
import type { PlannedSendState, SendContent } from "@/lib/domain/post/schema";
import { user } from "./auth";
import { idColumn, instant } from "./columns";
import { trip } from "./trip";

const tripRef = () =>
  text("trip_id")
    .notNull()
    .references(() => trip.id, { onDelete: "cascade" });

/** Words of a message that the leader keeps for this trip. */
export const messageTemplate = sqliteTable(
  "message_template",
  {
    id: idColumn(),
    tripId: tripRef(),
    name: text("name").notNull(),
    subject: text("subject").notNull(),
    body: text("body").notNull(),
    createdAt: instant("created_at").notNull(),
    updatedAt: instant("updated_at").notNull(),
  },
  (table) => [index("message_template_trip").on(table.tripId)],
);

/** A message that goes out at a time; papers are made then, as the plan is then. */
export const plannedSend = sqliteTable(
  "planned_send",
  {
    /** The request's id, so that it goes out once. */
    id: idColumn(),
    tripId: tripRef(),
    byUserId: text("by_user_id")
      .notNull()
      .references(() => user.id, { onDelete: "cascade" }),
    content: text("content", { mode: "json" }).$type<SendContent>().notNull(),
    sendAt: instant("send_at").notNull(),
    state: text("state").$type<PlannedSendState>().notNull().default("planned"),
    /** Why it did not go. */
    reason: text("reason"),
    createdAt: instant("created_at").notNull(),
  },
  (table) => [index("planned_send_due").on(table.state, table.sendAt), index("planned_send_trip").on(table.tripId)],
);

/** The trip's entry in people's calendars. */
export const tripCalendar = sqliteTable("trip_calendar", {
  tripId: text("trip_id")
    .primaryKey()
    .references(() => trip.id, { onDelete: "cascade" }),
  uid: text("uid").notNull(),
  sequence: integer("sequence").notNull().default(0),
  /** Of what the entry says; another one counts the sequence up. */
  fingerprint: text("fingerprint").notNull(),
  calledOffAt: instant("called_off_at"),
  updatedAt: instant("updated_at").notNull(),
});
