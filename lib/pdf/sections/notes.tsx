import type { Contact } from "@/lib/domain/trip/schema";
import { TYPE } from "../theme";
import { columns, spacer, stack, textBlock, type Block } from "./block";

/** A heading with a few lines under it. */
export function note(title: string, text: string, width: number): Block {
  return stack([
    textBlock(title, width, { size: TYPE.strong + 0.5, weight: 800 }),
    textBlock(text, width, { size: TYPE.body }),
  ]);
}

export function numberedNote(title: string, steps: readonly string[], width: number): Block {
  const indent = 14;
  return stack([
    textBlock(title, width, { size: TYPE.strong + 0.5, weight: 800 }),
    ...steps.map((step, index) =>
      columns([
        { width: indent, block: textBlock(`${index + 1}.`, indent, { size: TYPE.body, weight: 600 }) },
        { width: width - indent, block: textBlock(step, width - indent, { size: TYPE.body }) },
      ]),
    ),
  ]);
}

export function contactsNote(contacts: readonly Contact[], width: number): Block | null {
  if (contacts.length === 0) return null;
  return stack([
    textBlock("Call", width, { size: TYPE.strong + 0.5, weight: 800 }),
    ...contacts.flatMap((contact) => [
      textBlock([contact.name, contact.note].filter(Boolean).join(", "), width, { size: TYPE.body }),
      textBlock(contact.phone, width, { size: TYPE.strong + 0.5, weight: 800 }),
    ]),
  ]);
}

/** Blocks that are there, with even space between them. */
export function stackNotes(blocks: readonly (Block | null)[], gap = 8): Block {
  const present = blocks.filter((block): block is Block => block !== null);
  return present.length === 0 ? spacer(0) : stack(present, gap);
}
