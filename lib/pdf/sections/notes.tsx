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

const heightOf = (blocks: readonly Block[]): number => stackNotes(blocks).height;

/** Notes in their order in columns of this width, parted so that the tallest column is as low as it can be. */
export function noteColumns(notes: readonly (Block | null)[], width: number, count: number, gap: number): Block {
  const present = notes.filter((block): block is Block => block !== null);
  const part = (from: number, left: number): { readonly tallest: number; readonly parts: readonly Block[][] } => {
    if (left === 1) return { tallest: heightOf(present.slice(from)), parts: [present.slice(from)] };
    let best = { tallest: Infinity, parts: [] as Block[][] };
    for (let end = from; end <= present.length; end += 1) {
      const own = present.slice(from, end);
      const rest = part(end, left - 1);
      const tallest = Math.max(heightOf(own), rest.tallest);
      if (tallest < best.tallest) best = { tallest, parts: [own, ...rest.parts] };
    }
    return best;
  };
  return columns(
    part(0, count).parts.map((own) => ({ width, block: stackNotes(own) })),
    gap,
  );
}
