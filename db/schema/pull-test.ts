import { sql } from "drizzle-orm";
import { blob, check, index, integer, primaryKey, real, sqliteTable, text } from "drizzle-orm/sqlite-core";
import type { AnchorSpec } from "@/lib/calc/types";
import type { Patch, PullOutcome, TestedGround } from "@/lib/domain/pull-test/schema";
import type { Preferences } from "@/lib/domain/preferences";
import { user } from "./auth";
import { flag, idColumn, instant, versionColumn } from "./columns";
import { camp, trip } from "./trip";

/**
 * A reading of a scale on an anchor: at a camp of a trip, or in somebody's practice field. Anchor and ground are kept as
 * they were, so that a later change of kit or camp does not change what was read.
 */
export const pullTest = sqliteTable(
  "pull_test",
  {
    id: idColumn(),
    tripId: text("trip_id").references(() => trip.id, { onDelete: "cascade" }),
    campId: text("camp_id").references(() => camp.id, { onDelete: "cascade" }),
    patch: text("patch").$type<Patch>(),
    /** Of a reading in the practice field: whose it is. */
    ownerId: text("owner_id").references(() => user.id, { onDelete: "cascade" }),
    /** What the practice place is called; empty at a camp. */
    place: text("place").notNull().default(""),
    anchorName: text("anchor_name").notNull(),
    anchor: text("anchor", { mode: "json" }).$type<AnchorSpec>().notNull(),
    ground: text("ground", { mode: "json" }).$type<TestedGround>().notNull(),
    leanDeg: real("lean_deg").notNull(),
    lineAngleDeg: real("line_angle_deg").notNull(),
    depthOutM: real("depth_out_m").notNull(),
    /** As it was read, in its own unit. */
    force: real("force").notNull(),
    forceUnit: text("force_unit").$type<Preferences["forceUnit"]>().notNull(),
    outcome: text("outcome").$type<PullOutcome>().notNull(),
    note: text("note").notNull().default(""),
    isOff: flag("is_off").notNull().default(false),
    pulledAt: instant("pulled_at").notNull(),
    loggedBy: text("logged_by").references(() => user.id, { onDelete: "set null" }),
    loggedByName: text("logged_by_name").notNull(),
    version: versionColumn(),
    createdAt: instant("created_at").notNull(),
    updatedAt: instant("updated_at").notNull(),
  },
  (table) => [
    index("pull_test_camp").on(table.campId, table.pulledAt),
    index("pull_test_trip").on(table.tripId, table.campId),
    index("pull_test_owner").on(table.ownerId, table.pulledAt),
    index("pull_test_logger").on(table.loggedBy),
    check("pull_test_somewhere", sql`(${table.campId} is null) <> (${table.ownerId} is null)`),
  ],
);

/** The one photo of a reading, under a name made here, without the place where it was taken unless that was wanted. */
export const pullPhoto = sqliteTable("pull_photo", {
  id: idColumn(),
  pullTestId: text("pull_test_id")
    .notNull()
    .unique()
    .references(() => pullTest.id, { onDelete: "cascade" }),
  contentType: text("content_type").$type<"image/jpeg" | "image/png" | "image/webp">().notNull(),
  content: blob("content", { mode: "buffer" }).notNull(),
  byteCount: integer("byte_count").notNull(),
  createdAt: instant("created_at").notNull(),
});

/** What a leader chose about a patch of ground: without a row, readings from elsewhere count. */
export const learningChoice = sqliteTable(
  "learning_choice",
  {
    campId: text("camp_id")
      .notNull()
      .references(() => camp.id, { onDelete: "cascade" }),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    patch: text("patch").$type<Patch>().notNull(),
    usesElsewhere: flag("uses_elsewhere").notNull(),
  },
  (table) => [primaryKey({ columns: [table.campId, table.patch] }), index("learning_choice_trip").on(table.tripId)],
);
