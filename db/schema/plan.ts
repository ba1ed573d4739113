import { index, integer, real, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import type { Placement, ShelterAnalysis } from "@/lib/calc/types";
import type { PlanChange } from "@/lib/domain/plan/schema";
import { user } from "./auth";
import { flag, idColumn, instant } from "./columns";
import { pitch } from "./shelter";
import { camp, trip } from "./trip";

/** One staking plan per camp; its version is what two people compare. */
export const stakingPlan = sqliteTable(
  "staking_plan",
  {
    campId: text("camp_id")
      .primaryKey()
      .references(() => camp.id, { onDelete: "cascade" }),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    version: integer("version").notNull().default(0),
    updatedBy: text("updated_by").references(() => user.id, { onDelete: "set null" }),
    updatedByName: text("updated_by_name").notNull().default(""),
    updatedAt: instant("updated_at").notNull(),
  },
  (table) => [index("staking_plan_trip").on(table.tripId)],
);

export const placement = sqliteTable(
  "placement",
  {
    id: idColumn(),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    campId: text("camp_id")
      .notNull()
      .references(() => camp.id, { onDelete: "cascade" }),
    pitchId: text("pitch_id")
      .notNull()
      .references(() => pitch.id, { onDelete: "cascade" }),
    tieOutId: text("tie_out_id").notNull(),
    /** A kit item's id, or the id of something found at the camp. */
    anchorId: text("anchor_id").notNull(),
    leanDeg: real("lean_deg").notNull(),
    depthOutM: real("depth_out_m").notNull().default(0),
    tandem: text("tandem", { mode: "json" }).$type<Placement["tandem"]>(),
    rockKg: real("rock_kg").notNull().default(0),
    hasShockCord: flag("has_shock_cord").notNull().default(false),
    knot: text("knot").$type<Placement["knot"]>().notNull(),
    isPinned: flag("is_pinned").notNull().default(false),
  },
  (table) => [
    uniqueIndex("placement_spot").on(table.pitchId, table.tieOutId),
    index("placement_camp").on(table.campId),
    index("placement_anchor").on(table.tripId, table.anchorId),
  ],
);

/** Every change of a plan with the plan it led to: makes repeats safe and lets an earlier plan be brought back. */
export const planIntent = sqliteTable(
  "plan_intent",
  {
    /** Made by the client. */
    id: idColumn(),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    campId: text("camp_id")
      .notNull()
      .references(() => camp.id, { onDelete: "cascade" }),
    userId: text("user_id").references(() => user.id, { onDelete: "set null" }),
    userName: text("user_name").notNull(),
    baseVersion: integer("base_version").notNull(),
    resultVersion: integer("result_version").notNull(),
    change: text("change", { mode: "json" }).$type<PlanChange>().notNull(),
    createdAt: instant("created_at").notNull(),
  },
  (table) => [index("plan_intent_camp").on(table.campId, table.resultVersion)],
);

/** Shelters already worked out, by geometry and wind: the same for everybody, so it belongs to no trip. */
export const analysisCache = sqliteTable(
  "analysis_cache",
  {
    key: text("key").primaryKey(),
    analysis: text("analysis", { mode: "json" }).$type<ShelterAnalysis>().notNull(),
    usedAt: instant("used_at").notNull(),
  },
  (table) => [index("analysis_cache_used").on(table.usedAt)],
);
