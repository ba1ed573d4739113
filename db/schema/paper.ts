import { sql } from "drizzle-orm";
import { check, index, integer, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import type { CommentMention } from "@/lib/domain/comment/schema";
import type { OwnPages } from "@/lib/domain/own-pages/own-pages";
import { user } from "./auth";
import { idColumn, instant } from "./columns";
import { shelter } from "./shelter";
import { camp, person, trip } from "./trip";

/** Somebody's own pages as they left the desk: printed, or sent by mail. What it said is kept, to tell what is old. */
export const paperCopy = sqliteTable(
  "paper_copy",
  {
    id: idColumn(),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    /** Whose pages they are. */
    personId: text("person_id")
      .notNull()
      .references(() => person.id, { onDelete: "cascade" }),
    way: text("way").$type<"printed" | "sent">().notNull(),
    version: integer("version").notNull(),
    content: text("content", { mode: "json" }).$type<OwnPages>().notNull(),
    userName: text("user_name").notNull(),
    createdAt: instant("created_at").notNull(),
  },
  (table) => [
    index("paper_copy_person").on(table.personId, table.createdAt),
    uniqueIndex("paper_copy_once").on(table.personId, table.way, table.version),
  ],
);

/** What somebody had before them when they last said that they have read their pages. */
export const paperLook = sqliteTable("paper_look", {
  personId: text("person_id")
    .primaryKey()
    .references(() => person.id, { onDelete: "cascade" }),
  tripId: text("trip_id")
    .notNull()
    .references(() => trip.id, { onDelete: "cascade" }),
  version: integer("version").notNull(),
  content: text("content", { mode: "json" }).$type<OwnPages>().notNull(),
  seenAt: instant("seen_at").notNull(),
});

/** A remark of leader or co-leader on a camp or on a shelter. */
export const comment = sqliteTable(
  "comment",
  {
    /** Made by the form, so that a second press writes nothing twice. */
    id: idColumn(),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    campId: text("camp_id").references(() => camp.id, { onDelete: "cascade" }),
    shelterId: text("shelter_id").references(() => shelter.id, { onDelete: "cascade" }),
    userId: text("user_id").references(() => user.id, { onDelete: "set null" }),
    userName: text("user_name").notNull(),
    body: text("body").notNull(),
    mentions: text("mentions", { mode: "json" }).$type<CommentMention[]>().notNull().default([]),
    createdAt: instant("created_at").notNull(),
  },
  (table) => [
    index("comment_camp").on(table.campId, table.createdAt),
    index("comment_shelter").on(table.shelterId, table.createdAt),
    index("comment_trip").on(table.tripId, table.createdAt),
    check("comment_subject", sql`(${table.campId} is null) <> (${table.shelterId} is null)`),
  ],
);
