import { blob, index, integer, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import type { Preferences } from "@/lib/domain/preferences";
import type { MessageState } from "@/lib/domain/post/schema";
import { user } from "./auth";
import { idColumn, instant } from "./columns";
import { person, trip } from "./trip";

/** Mail that waits to be sent, one row per recipient, written in the transaction of what caused it. */
export const outboxMessage = sqliteTable(
  "outbox_message",
  {
    id: idColumn(),
    /** Null for mail about an account (verification, reset). */
    tripId: text("trip_id").references(() => trip.id, { onDelete: "cascade" }),
    personId: text("person_id").references(() => person.id, { onDelete: "set null" }),
    kind: text("kind").notNull(),
    /** Of the send that made it: the same request never makes two. */
    requestId: text("request_id").notNull(),
    toName: text("to_name").notNull(),
    toAddress: text("to_address").notNull(),
    replyToName: text("reply_to_name"),
    replyToAddress: text("reply_to_address"),
    subject: text("subject").notNull(),
    text: text("text").notNull(),
    html: text("html").notNull(),
    messageId: text("message_id").notNull().unique(),
    state: text("state").$type<MessageState>().notNull().default("waiting"),
    attempts: integer("attempts").notNull().default(0),
    nextAttemptAt: instant("next_attempt_at").notNull(),
    leaseUntil: instant("lease_until"),
    lastError: text("last_error"),
    createdAt: instant("created_at").notNull(),
    sentAt: instant("sent_at"),
    /** When the person said themselves that they have read it. */
    readAt: instant("read_at"),
  },
  (table) => [
    uniqueIndex("outbox_request_address").on(table.requestId, table.toAddress),
    index("outbox_due").on(table.state, table.nextAttemptAt),
    index("outbox_trip").on(table.tripId, table.createdAt),
    // The worker asks for each message whether an earlier one to the same person still waits.
    index("outbox_address").on(table.toAddress, table.state, table.createdAt),
  ],
);

/** A file kept once by its content, however many messages carry it. */
export const outboxFile = sqliteTable("outbox_file", {
  /** SHA-256 of the content. */
  id: idColumn(),
  content: blob("content", { mode: "buffer" }).notNull(),
  createdAt: instant("created_at").notNull(),
});

export const outboxAttachment = sqliteTable(
  "outbox_attachment",
  {
    id: idColumn(),
    messageId: text("message_id")
      .notNull()
      .references(() => outboxMessage.id, { onDelete: "cascade" }),
    fileId: text("file_id")
      .notNull()
      .references(() => outboxFile.id),
    fileName: text("file_name").notNull(),
    contentType: text("content_type").notNull(),
    position: integer("position").notNull(),
  },
  (table) => [index("outbox_attachment_message").on(table.messageId)],
);

/** What the local fake SMTP server received; only filled when no real server is set. */
export const capturedMail = sqliteTable(
  "captured_mail",
  {
    id: idColumn(),
    toAddress: text("to_address").notNull(),
    subject: text("subject").notNull(),
    raw: blob("raw", { mode: "buffer" }).notNull(),
    receivedAt: instant("received_at").notNull(),
  },
  (table) => [index("captured_mail_received").on(table.receivedAt)],
);

/** Counts requests of things that cost much (mail, PDF), by person and kind. */
export const requestQuota = sqliteTable("request_quota", {
  id: idColumn(),
  key: text("key").notNull().unique(),
  windowStart: instant("window_start").notNull(),
  count: integer("count").notNull(),
});

export const preference = sqliteTable("preference", {
  userId: text("user_id")
    .primaryKey()
    .references(() => user.id, { onDelete: "cascade" }),
  preferences: text("preferences", { mode: "json" }).$type<Preferences>().notNull(),
});
