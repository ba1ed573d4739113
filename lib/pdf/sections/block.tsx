import type { ReactElement } from "react";
import { Text, View } from "@react-pdf/renderer";
import { FONT_STACK, type FontWeight } from "../fonts";
import { layLines, textWidth } from "../measure";
import { HAIR, INK, LEADING } from "../theme";

/** A piece of a page whose height is known before it is drawn, so that pages are filled on purpose. */
export interface Block {
  readonly height: number;
  readonly node: ReactElement;
}

export interface TextStyle {
  readonly size: number;
  readonly weight?: FontWeight;
  readonly color?: string;
  readonly align?: "left" | "right" | "center";
  readonly leading?: number;
}

/** Lines that were laid beforehand; nothing is wrapped again. */
export function TextLines({ lines, style }: { lines: readonly string[]; style: TextStyle }) {
  const { size, weight = 400, color = INK, align = "left", leading = LEADING } = style;
  return (
    <Text
      style={{
        fontFamily: FONT_STACK,
        fontSize: size,
        fontWeight: weight,
        lineHeight: leading,
        color,
        textAlign: align,
      }}
    >
      {lines.join("\n")}
    </Text>
  );
}

/** The space by which the measured width may be off. */
const SLACK = 0.985;

export function textBlock(text: string, width: number, style: TextStyle): Block {
  const lines = layLines(text, width * SLACK, style.size, style.weight);
  return {
    height: lines.length * style.size * (style.leading ?? LEADING),
    node: <TextLines lines={lines} style={style} />,
  };
}

/** The largest of the sizes at which a text takes at most so many lines; the last one if none does. */
export function fittingSize(
  text: string,
  width: number,
  sizes: readonly number[],
  weight: FontWeight,
  maxLines = 1,
): number {
  const fits = (size: number) =>
    maxLines === 1
      ? textWidth(text, size, weight) <= width * SLACK
      : layLines(text, width * SLACK, size, weight).length <= maxLines;
  return sizes.find(fits) ?? sizes[sizes.length - 1] ?? 10;
}

export function stack(blocks: readonly Block[], gap = 0): Block {
  const height = blocks.reduce((sum, block) => sum + block.height, 0) + gap * Math.max(0, blocks.length - 1);
  return {
    height,
    node: (
      <View>
        {blocks.map((block, index) => (
          <View key={index} style={{ marginTop: index === 0 ? 0 : gap }}>
            {block.node}
          </View>
        ))}
      </View>
    ),
  };
}

export interface Column {
  readonly width: number;
  readonly block: Block | null;
}

export function columns(parts: readonly Column[], gap = 0): Block {
  return {
    height: Math.max(0, ...parts.map((part) => part.block?.height ?? 0)),
    node: (
      <View style={{ flexDirection: "row" }}>
        {parts.map((part, index) => (
          <View key={index} style={{ width: part.width, marginLeft: index === 0 ? 0 : gap }}>
            {part.block?.node}
          </View>
        ))}
      </View>
    ),
  };
}

export function spacer(height: number): Block {
  return { height, node: <View style={{ height }} /> };
}

export function rule(thickness: number, color: string = INK): Block {
  return { height: thickness, node: <View style={{ height: thickness, backgroundColor: color }} /> };
}

export const hairline = (): Block => rule(0.6, HAIR);

/** Fills pages in order; a block that asks to stay with the next one is never the last of its page. */
export function fillPages(
  blocks: readonly (Block & { readonly keepsWithNext?: boolean })[],
  heightOfPage: (index: number) => number,
): Block[][] {
  const pages: Block[][] = [[]];
  let left = heightOfPage(0);
  for (let i = 0; i < blocks.length;) {
    const group = [blocks[i]].flatMap((block) => (block ? [block] : []));
    while (group[group.length - 1]?.keepsWithNext && i + group.length < blocks.length) {
      const next = blocks[i + group.length];
      if (next) group.push(next);
    }
    const height = group.reduce((sum, block) => sum + block.height, 0);
    const page = pages[pages.length - 1] ?? [];
    if (height > left && page.length > 0) {
      pages.push([...group]);
      left = heightOfPage(pages.length - 1) - height;
    } else {
      page.push(...group);
      left -= height;
    }
    i += group.length;
  }
  return pages;
}
