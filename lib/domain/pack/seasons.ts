import { z } from "zod";
import { idSchema } from "../ids";

export const SEASONS = ["summer", "spring-autumn", "winter"] as const;
export type Season = (typeof SEASONS)[number];

export const SEASON_NAMES: Readonly<Record<Season, string>> = {
  summer: "summer",
  "spring-autumn": "spring or autumn",
  winter: "winter",
};

/** What a season adds to everybody's list (judgement); the leader changes it to suit. */
export const SEASON_PACK_ITEMS: Readonly<Record<Season, readonly string[]>> = {
  summer: ["Sun hat", "Sun cream", "Insect net and repellent", "Light long sleeves", "Second water bottle"],
  "spring-autumn": ["Second warm layer", "Gaiters", "Dry bag for the sleeping bag", "Spare gloves", "Thermos flask"],
  winter: [
    "Winter sleeping bag and second mat",
    "Down or thick jacket",
    "Two pairs of thick gloves",
    "Goggles",
    "Gaiters",
    "Snow shovel",
    "Thermos flask",
    "Spare dry layer in a bag",
  ],
};

export const seasonAddInput = z.object({ tripId: idSchema, season: z.enum(SEASONS, { error: "Choose a season." }) });
