import type { ReactElement } from "react";
import { Page, View } from "@react-pdf/renderer";
import type { PaperHeader } from "@/lib/domain/views";
import { FONT_STACK } from "../fonts";
import { printable } from "../glyphs";
import { CAUTIONS, GREY, LEADING, TYPE, type Sheet } from "../theme";
import { shortAddress } from "../words";
import { qrCode } from "./qr-code";
import { columns, fittingSize, hairline, rule, spacer, stack, textBlock, type Block } from "./block";

const RIGHT_WIDTH = 108;
const QR_SIDE = 62;
const NUMBER_WIDTH = 84;

export interface Heading {
  readonly kicker: string;
  readonly title: string;
}

/** Top of a paper: trip, night and day above the title; version, time of printing and the way to the live page right. */
export function pageHeader(header: PaperHeader, { kicker, title }: Heading, sheet: Sheet): Block {
  const code = qrCode(header.address, QR_SIDE);
  const left = sheet.inner - RIGHT_WIDTH - code.side - 20;
  const size = fittingSize(title, left, [TYPE.title, 24, 21, 18, 16, 13], 800);
  const text = stack([
    textBlock(kicker, left, { size: TYPE.body }),
    textBlock(title, left, { size, weight: 800, leading: 1.2 }),
  ]);
  const height = Math.max(text.height, code.side);
  return stack([
    columns(
      [
        { width: left, block: stack([spacer(height - text.height), text]) },
        { width: RIGHT_WIDTH, block: stack([spacer(height - 2 * TYPE.body * LEADING - 2), printed(header)]) },
        { width: code.side, block: code.block },
      ],
      10,
    ),
    spacer(5),
    rule(2),
  ]);
}

function printed(header: PaperHeader): Block {
  const style = { size: TYPE.body, align: "right" } as const;
  return stack([
    textBlock(`version ${header.version}`, RIGHT_WIDTH, style),
    textBlock(`printed ${header.printedAt}`, RIGHT_WIDTH, style),
  ]);
}

/** Top of the second and later pages of a paper. */
export function continuedHeader(header: PaperHeader, { kicker, title }: Heading, sheet: Sheet): Block {
  const left = sheet.inner - RIGHT_WIDTH - 12;
  const text = `${title}, continued`;
  return stack([
    columns(
      [
        {
          width: left,
          block: stack([
            textBlock(kicker, left, { size: TYPE.body }),
            textBlock(text, left, { size: fittingSize(text, left, [16, 13], 800), weight: 800 }),
          ]),
        },
        { width: RIGHT_WIDTH, block: stack([spacer(6), printed(header)]) },
      ],
      12,
    ),
    spacer(4),
    rule(2),
  ]);
}

/** Cautions, live address and page number; on every page. */
function pageFooter(header: PaperHeader, sheet: Sheet): Block {
  return stack([
    hairline(),
    spacer(4),
    textBlock(CAUTIONS, sheet.inner, { size: TYPE.small }),
    spacer(2),
    textBlock(`Live page: ${shortAddress(header.address)}`, sheet.inner - NUMBER_WIDTH, {
      size: TYPE.small,
      color: GREY,
    }),
  ]);
}

/** Height between header and footer. */
export function bodyHeight(header: PaperHeader, sheet: Sheet, top: Block): number {
  return sheet.height - 2 * sheet.margin - top.height - pageFooter(header, sheet).height - 8;
}

export interface PageFrameProps {
  readonly sheet: Sheet;
  readonly header: PaperHeader;
  readonly top: Block;
  readonly bookmark?: string;
  /** Set when all pages of the document are known. */
  readonly page?: number;
  readonly pageCount?: number;
  readonly children: ReactElement;
}

export function PageFrame({ sheet, header, top, bookmark, page = 1, pageCount = 1, children }: PageFrameProps) {
  const footer = pageFooter(header, sheet);
  return (
    <Page
      size={sheet.size}
      style={{ padding: sheet.margin, fontFamily: FONT_STACK, fontSize: TYPE.body, lineHeight: LEADING }}
      bookmark={bookmark === undefined ? undefined : { title: printable(bookmark) }}
    >
      {top.node}
      {children}
      <View style={{ position: "absolute", left: sheet.margin, right: sheet.margin, bottom: sheet.margin }}>
        {footer.node}
        <View style={{ position: "absolute", right: 0, bottom: 0, width: NUMBER_WIDTH }}>
          {textBlock(`page ${page} of ${pageCount}`, NUMBER_WIDTH, { size: TYPE.small, align: "right" }).node}
        </View>
      </View>
    </Page>
  );
}
