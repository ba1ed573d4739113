import type { ReactElement } from "react";
import { Page, Text, View } from "@react-pdf/renderer";
import type { PaperHeader } from "@/lib/domain/views";
import { FONT_STACK } from "../fonts";
import { printable } from "../glyphs";
import { CAUTIONS, GREY, LEADING, TYPE, type Sheet } from "../theme";
import { shortAddress } from "../words";
import { columns, fittingSize, hairline, rule, spacer, stack, textBlock, type Block } from "./block";

const RIGHT_WIDTH = 128;

export interface Heading {
  readonly kicker: string;
  readonly title: string;
}

/** Top of each page: trip, night and day above the title; version and time of printing at the right. */
export function pageHeader(header: PaperHeader, { kicker, title }: Heading, sheet: Sheet, isContinued = false): Block {
  const left = sheet.inner - RIGHT_WIDTH - 12;
  const sizes = isContinued ? [16, 13] : [TYPE.title, 23, 19, 16, 13];
  const size = fittingSize(title, left, sizes, 800, 1);
  return stack([
    columns(
      [
        {
          width: left,
          block: stack([
            textBlock(kicker, left, { size: TYPE.body }),
            textBlock(isContinued ? `${title}, continued` : title, left, { size, weight: 800 }),
          ]),
        },
        {
          width: RIGHT_WIDTH,
          block: stack([
            spacer(isContinued ? 0 : 7),
            textBlock(`version ${header.version}`, RIGHT_WIDTH, { size: TYPE.body, align: "right" }),
            textBlock(`printed ${header.printedAt}`, RIGHT_WIDTH, { size: TYPE.body, align: "right" }),
          ]),
        },
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
    textBlock(`Live page: ${shortAddress(header.address)}`, sheet.inner - 90, { size: TYPE.small, color: GREY }),
  ]);
}

/** Height between header and footer. */
export function bodyHeight(header: PaperHeader, sheet: Sheet, top: Block): number {
  return sheet.height - 2 * sheet.margin - top.height - pageFooter(header, sheet).height - 8;
}

export function PageFrame({
  sheet,
  header,
  top,
  bookmark,
  children,
}: {
  sheet: Sheet;
  header: PaperHeader;
  top: Block;
  bookmark?: string;
  children: ReactElement;
}) {
  const footer = pageFooter(header, sheet);
  return (
    <Page
      size={sheet.size}
      wrap={false}
      style={{ padding: sheet.margin, fontFamily: FONT_STACK, fontSize: TYPE.body, lineHeight: LEADING }}
      bookmark={bookmark === undefined ? undefined : { title: printable(bookmark) }}
    >
      <View style={{ height: top.height }}>{top.node}</View>
      {children}
      <View
        style={{
          position: "absolute",
          left: sheet.margin,
          right: sheet.margin,
          bottom: sheet.margin,
          height: footer.height,
        }}
      >
        {footer.node}
        <Text
          style={{ position: "absolute", right: 0, bottom: 0, fontSize: TYPE.small, color: GREY, textAlign: "right" }}
          render={({ pageNumber, totalPages }) => `page ${pageNumber} of ${totalPages}`}
        />
      </View>
    </Page>
  );
}
