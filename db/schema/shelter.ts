import { index, integer, real, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import type { ShelterSpec } from "@/lib/calc/types";
import type { KitItemDetails } from "@/lib/domain/kit/schema";
import type { PitchDetails, ShelterDetails } from "@/lib/domain/shelter/schema";
import { user } from "./auth";
import { flag, idColumn, instant, versionColumn } from "./columns";
import { camp, person, trip } from "./trip";

export const shelter = sqliteTable(
  "shelter",
  {
    id: idColumn(),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    position: integer("position").notNull(),
    name: text("name").notNull(),
    sleeps: integer("sleeps").notNull(),
    massKg: real("mass_kg"),
    spec: text("spec", { mode: "json" }).$type<ShelterSpec>().notNull(),
    version: versionColumn(),
    createdAt: instant("created_at").notNull(),
    updatedAt: instant("updated_at").notNull(),
  },
  (table) => [index("shelter_trip").on(table.tripId, table.position)],
);

/** A shelter standing at a camp. */
export const pitch = sqliteTable(
  "pitch",
  {
    id: idColumn(),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    campId: text("camp_id")
      .notNull()
      .references(() => camp.id, { onDelete: "cascade" }),
    shelterId: text("shelter_id")
      .notNull()
      .references(() => shelter.id, { onDelete: "cascade" }),
    position: integer("position").notNull(),
    headingDeg: real("heading_deg").notNull(),
    patch: text("patch").$type<PitchDetails["patch"]>().notNull(),
    dimensions: text("dimensions", { mode: "json" }).$type<Record<string, number>>().notNull(),
    lineLengthsM: text("line_lengths_m", { mode: "json" }).$type<Record<string, number>>().notNull(),
    version: versionColumn(),
    updatedAt: instant("updated_at").notNull(),
  },
  (table) => [
    uniqueIndex("pitch_camp_shelter").on(table.campId, table.shelterId),
    index("pitch_trip").on(table.tripId),
  ],
);

/** Where somebody sleeps at a camp; the unique index keeps everybody to one place. */
export const sleeper = sqliteTable(
  "sleeper",
  {
    id: idColumn(),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    campId: text("camp_id")
      .notNull()
      .references(() => camp.id, { onDelete: "cascade" }),
    personId: text("person_id")
      .notNull()
      .references(() => person.id, { onDelete: "cascade" }),
    /** Null: sleeps outside, and said so. */
    pitchId: text("pitch_id").references(() => pitch.id, { onDelete: "cascade" }),
  },
  (table) => [
    uniqueIndex("sleeper_camp_person").on(table.campId, table.personId),
    index("sleeper_trip").on(table.tripId),
  ],
);

export const kitItem = sqliteTable(
  "kit_item",
  {
    id: idColumn(),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    position: integer("position").notNull(),
    details: text("details", { mode: "json" }).$type<KitItemDetails>().notNull(),
    version: versionColumn(),
    createdAt: instant("created_at").notNull(),
    updatedAt: instant("updated_at").notNull(),
  },
  (table) => [index("kit_item_trip").on(table.tripId, table.position)],
);

/** A person's own shelters and anchors, outside any trip. */
export const gear = sqliteTable(
  "gear",
  {
    id: idColumn(),
    ownerId: text("owner_id")
      .notNull()
      .references(() => user.id, { onDelete: "cascade" }),
    details: text("details", { mode: "json" })
      .$type<{ type: "shelter"; shelter: ShelterDetails } | { type: "anchor"; anchor: KitItemDetails }>()
      .notNull(),
    version: versionColumn(),
    createdAt: instant("created_at").notNull(),
    updatedAt: instant("updated_at").notNull(),
  },
  (table) => [index("gear_owner").on(table.ownerId)],
);

/** What somebody brings for themselves: `personId` null is on everybody's list. */
export const packItem = sqliteTable(
  "pack_item",
  {
    id: idColumn(),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    personId: text("person_id").references(() => person.id, { onDelete: "cascade" }),
    position: integer("position").notNull(),
    name: text("name").notNull(),
    /** True for a group thing that this person carries (stove, first aid). */
    isGroupThing: flag("is_group_thing").notNull().default(false),
    massKg: real("mass_kg"),
  },
  (table) => [index("pack_item_trip").on(table.tripId)],
);

/** Who carries which of the group's gear. */
export const carry = sqliteTable(
  "carry",
  {
    id: idColumn(),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    personId: text("person_id")
      .notNull()
      .references(() => person.id, { onDelete: "cascade" }),
    shelterId: text("shelter_id").references(() => shelter.id, { onDelete: "cascade" }),
    kitItemId: text("kit_item_id").references(() => kitItem.id, { onDelete: "cascade" }),
    groupThingId: text("group_thing_id"),
    /** Of a shelter: which part; null = all of it. */
    part: text("part").$type<"fly" | "poles">(),
    /** Sharing out leaves it where it is. */
    isFixed: flag("is_fixed").notNull().default(false),
    count: integer("count").notNull().default(1),
  },
  (table) => [index("carry_trip").on(table.tripId)],
);

/** What a person has ticked off on their own list: ids of pack items, shelters and kit items. */
export const packTick = sqliteTable(
  "pack_tick",
  {
    id: idColumn(),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    personId: text("person_id")
      .notNull()
      .references(() => person.id, { onDelete: "cascade" }),
    itemKey: text("item_key").notNull(),
    tickedAt: instant("ticked_at").notNull(),
  },
  (table) => [
    uniqueIndex("pack_tick_person_item").on(table.personId, table.itemKey),
    index("pack_tick_trip").on(table.tripId),
  ],
);
