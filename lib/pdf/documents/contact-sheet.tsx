import type { ReactElement } from "react";
import { ROLE_NAMES } from "@/lib/domain/permissions/permissions";
import type { ContactSheetView } from "@/lib/domain/people-views";
import type { PaperHeader } from "@/lib/domain/views";
import { columns, fillPages, hairline, spacer, stack, textBlock, type Block } from "../sections/block";
import { contactsNote, note, stackNotes } from "../sections/notes";
import {
  bodyHeight,
  continuedHeader,
  PageFrame,
  pageHeader,
  type Heading,
  type PageFrameProps,
} from "../sections/page-frame";
import { GREY, TYPE, type Sheet } from "../theme";

type SheetPerson = ContactSheetView["people"][number];
type PageBlock = Block & { keepsWithNext?: boolean };

const GAP = 14;

/** For leaders: whom to call, what to know about each, where to meet and the way out. */
export function contactSheetPages(
  header: PaperHeader,
  view: ContactSheetView,
  sheet: Sheet,
): ReactElement<PageFrameProps>[] {
  const heading: Heading = { kicker: `${header.tripName} · for leaders only`, title: "Contact sheet" };
  const top = pageHeader(header, heading, sheet);
  const nextTop = continuedHeader(header, heading, sheet);
  const blocks: PageBlock[] = [
    ...general(view, sheet.inner),
    { ...title("People", sheet.inner), keepsWithNext: true },
    ...view.people.flatMap((person) => personBlocks(person, sheet.inner)),
  ];
  const pages = fillPages(blocks, (index) => bodyHeight(header, sheet, index === 0 ? top : nextTop));
  return pages.map((page, index) => (
    <PageFrame
      key={`contact-sheet-${index}`}
      sheet={sheet}
      header={header}
      top={index === 0 ? top : nextTop}
      bookmark={index === 0 ? "Contact sheet" : undefined}
    >
      {stack(page).node}
    </PageFrame>
  ));
}

const title = (text: string, width: number): Block =>
  stack([spacer(12), textBlock(text, width, { size: TYPE.number, weight: 800 })]);

function general(view: ContactSheetView, width: number): PageBlock[] {
  const each = (width - GAP) / 2;
  const left = stackNotes([
    view.groupPhone ? note("Telephone of the group", view.groupPhone, each) : null,
    contactsNote(view.contacts, each),
  ]);
  const right = stackNotes([
    note("Meeting points", view.meetingPoints || "not written yet", each),
    note("Way out", view.wayOut || "not written yet", each),
  ]);
  return [
    stack([
      spacer(8),
      columns(
        [
          { width: each, block: left },
          { width: each, block: right },
        ],
        GAP,
      ),
    ]),
  ];
}

/** A name with its numbers keeps together; long notes may run over pages, paragraph by paragraph. */
function personBlocks({ name, role, details }: SheetPerson, width: number): PageBlock[] {
  const each = (width - GAP) / 2;
  const small = { size: TYPE.body } as const;
  const phone = typeof details === "object" ? details?.phone : "";
  const head = stack([
    textBlock(name, each, { size: TYPE.number, weight: 800 }),
    textBlock(ROLE_NAMES[role], each, { size: TYPE.small, color: GREY }),
    ...(phone ? [textBlock(phone, each, { size: TYPE.number, weight: 600 })] : []),
  ]);
  if (details === null || details === "unreadable") {
    const why = details === null ? "Has written nothing." : "Can't be read with the keys that this server has.";
    const remark = textBlock(why, each, small);
    return [row(head, remark, each)];
  }
  const calls =
    details.emergencyContacts.length === 0
      ? textBlock("No emergency contact named.", each, small)
      : stack(
          details.emergencyContacts.flatMap((contact) => [
            textBlock([contact.name, contact.relation].filter(Boolean).join(", "), each, small),
            textBlock(contact.phone, each, { size: TYPE.number, weight: 600 }),
          ]),
        );
  return [
    { ...row(head, calls, each), keepsWithNext: true },
    ...labelled("Health", details.health, width),
    ...labelled("Food", details.diet, width),
  ];
}

const row = (left: Block, right: Block, each: number): Block =>
  stack([
    spacer(5),
    hairline(),
    spacer(6),
    columns(
      [
        { width: each, block: left },
        { width: each, block: right },
      ],
      GAP,
    ),
  ]);

function labelled(label: string, text: string, width: number): PageBlock[] {
  const lines = (text || "nothing").split("\n");
  return lines.map((line, index) =>
    stack([spacer(3), textBlock(index === 0 ? `${label}: ${line}` : line, width, { size: TYPE.strong })]),
  );
}
