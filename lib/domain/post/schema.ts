import { z } from "zod";
import { idSchema } from "../ids";
import { PAPER_SIZES } from "../paper/schema";
import { daySchema } from "../trip/schema";
import { blockText, lineText } from "../text";

export const MESSAGE_STATES = ["waiting", "sending", "sent", "failed"] as const;
export type MessageState = (typeof MESSAGE_STATES)[number];

/** What a message can carry: each person's own pages, every camp's field card, or the whole booklet. */
export const PIECES = [
  { key: "pitch-and-pack", name: "Own pages, pitch and pack in one file" },
  { key: "pack-list", name: "Own pack list" },
  { key: "pitch-cards", name: "Pitch cards of their shelters" },
  { key: "field-cards", name: "Field cards of all camps" },
  { key: "booklet", name: "Whole booklet" },
  { key: "calendar", name: "Calendar file of the trip" },
] as const;
export const PIECE_KEYS = PIECES.map((piece) => piece.key);
export type PieceKey = (typeof PIECES)[number]["key"];

/** Something to be done once, however often the button is pressed. */
export const requestInput = z.object({ tripId: idSchema, requestId: idSchema });
/** All but the calendar file are paper. */
export type PaperPiece = Exclude<PieceKey, "calendar">;

export const messageRefInput = z.object({ tripId: idSchema, messageId: idSchema });

const sendContent = z.object({
  personIds: z
    .array(idSchema)
    .min(1, "Choose at least one person.")
    .max(100, "At most 100 people at once.")
    .refine((ids) => new Set(ids).size === ids.length, "Somebody is chosen twice."),
  pieces: z.array(z.enum(PIECE_KEYS)).max(PIECE_KEYS.length, "Choose each piece once."),
  subject: lineText("a subject", 150),
  message: blockText("the message", 4000),
  paperSize: z.enum(PAPER_SIZES),
});
export type SendContent = z.infer<typeof sendContent>;

const saysSomething = ({ pieces, message }: Pick<SendContent, "pieces" | "message">) =>
  pieces.length > 0 || message !== "";
const SAYS_NOTHING = { path: ["pieces"], message: "Choose a piece, or write a message." };

const sendFields = sendContent.extend({
  tripId: idSchema,
  /** Made by the client: a double click has one effect. */
  requestId: idSchema,
});
export const sendInput = sendFields.refine(saysSomething, SAYS_NOTHING);
export type SendInput = z.infer<typeof sendInput>;

export const PLANNED_SEND_STATES = ["planned", "sent", "cancelled", "failed"] as const;
export type PlannedSendState = (typeof PLANNED_SEND_STATES)[number];

export const planSendInput = sendFields
  .extend({
    sendDay: daySchema,
    sendTime: z.string().regex(/^([01]\d|2[0-3]):[0-5]\d$/, "Enter a time, like 18:30."),
  })
  .refine(saysSomething, SAYS_NOTHING);
export const plannedSendRefInput = z.object({ tripId: idSchema, plannedSendId: idSchema });

export const templateInput = z.object({
  tripId: idSchema,
  name: lineText("a name for the template", 60),
  subject: lineText("a subject", 150),
  body: blockText("the message", 4000).refine((text) => text !== "", "Write the message."),
});
export const templateRefInput = z.object({ tripId: idSchema, templateId: idSchema });

export const callOffInput = z.object({
  tripId: idSchema,
  requestId: idSchema,
  isOff: z.boolean(),
  message: blockText("the message", 2000).default(""),
});
