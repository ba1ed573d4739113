import { Line, Page, Svg, View } from "@react-pdf/renderer";
import { POCKET_FOLD } from "@/lib/domain/paper/impose";
import type { PaperHeader } from "@/lib/domain/views";
import { FONT_STACK } from "../fonts";
import { printable } from "../glyphs";
import { LEADING, PALE, type Sheet } from "../theme";
import { columns, fittingSize, rule, spacer, stack, textBlock, type Block } from "./block";
import type { Heading } from "./page-frame";
import { qrCode } from "./qr-code";

const MARGIN = 17;
const SIZE = 9;
const QR_SIDE = 58;

/** A quarter of a sheet as a page of its own. */
export function panelSheet(sheet: Sheet): Sheet {
  const width = sheet.width / 2;
  return { ...sheet, width, height: sheet.height / 2, margin: MARGIN, inner: width - 2 * MARGIN };
}

export interface PanelPage {
  readonly top: Block;
  readonly body: Block;
}

/** On the first small page whose it is and the way to the live page; on each one version and number. */
export function panelTop(header: PaperHeader, { kicker, title }: Heading, panel: Sheet, index: number): Block {
  const version = `version ${header.version}`;
  if (index > 0) {
    const right = 62;
    const left = panel.inner - right - 6;
    return stack([
      columns(
        [
          { width: left, block: textBlock(`${title} · ${version}`, left, { size: SIZE, weight: 600 }) },
          { width: right, block: textBlock(`${index + 1} of 4`, right, { size: SIZE, align: "right" }) },
        ],
        6,
      ),
      spacer(2),
      rule(1),
    ]);
  }
  const code = qrCode(header.address, QR_SIDE);
  const left = panel.inner - code.side - 8;
  const text = stack([
    textBlock(kicker, left, { size: SIZE }),
    textBlock(title, left, { size: fittingSize(title, left, [18, 15, 12], 800), weight: 800, leading: 1.2 }),
    textBlock(`${version}, printed ${header.printedAt}`, left, { size: SIZE }),
  ]);
  return stack([
    columns(
      [
        { width: left, block: text },
        { width: code.side, block: code.block },
      ],
      8,
    ),
    spacer(4),
    rule(1.5),
  ]);
}

/** Four small pages on one side: fold the top back, then the left side back. */
export function FoldedSheet({
  sheet,
  panels,
  title,
}: {
  sheet: Sheet;
  panels: readonly PanelPage[];
  title: string;
  page?: number;
  pageCount?: number;
}) {
  const [width, height] = [sheet.width / 2, sheet.height / 2];
  return (
    <Page
      size={sheet.size}
      style={{ fontFamily: FONT_STACK, fontSize: SIZE, lineHeight: LEADING }}
      bookmark={{ title: printable(title) }}
    >
      {POCKET_FOLD.map(({ page, column, row, isUpsideDown }) => {
        const panel = panels[page - 1];
        if (!panel) return null;
        return (
          <View
            key={page}
            style={{
              position: "absolute",
              left: column * width,
              top: row * height,
              width,
              height,
              padding: MARGIN,
              transform: isUpsideDown ? "rotate(180deg)" : undefined,
            }}
          >
            {panel.top.node}
            {panel.body.node}
          </View>
        );
      })}
      <View style={{ position: "absolute", left: 0, top: 0 }}>
        <Svg width={sheet.width} height={sheet.height}>
          <Line x1={width} y1={0} x2={width} y2={sheet.height} stroke={PALE} strokeWidth={0.5} strokeDasharray="3 4" />
          <Line x1={0} y1={height} x2={sheet.width} y2={height} stroke={PALE} strokeWidth={0.5} strokeDasharray="3 4" />
        </Svg>
      </View>
    </Page>
  );
}
