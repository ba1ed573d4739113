import { View } from "@react-pdf/renderer";
import type { TrayAnchor } from "@/lib/calc/types";
import { TYPE } from "../theme";
import { spacer, stack, textBlock, type Block } from "./block";
import { AnchorIcon } from "./marks";
import type { TieOutRow } from "./tie-out-table";

const MARK = 13;
const GAP = 14;

/** Which mark is which anchor and where it goes, for a drawing whose table is overleaf. */
export function anchorsUsed(rows: readonly TieOutRow[], width: number): Block {
  const numbers = new Map<TrayAnchor, number[]>();
  for (const { anchor, result } of rows) {
    if (anchor) numbers.set(anchor, [...(numbers.get(anchor) ?? []), result.number]);
  }
  const each = (width - GAP) / 2;
  const cells = [...numbers].map(([anchor, at]) => ({
    anchor,
    text: textBlock(`${anchor.name}: ${at.join(", ")}`, each - MARK - 6, { size: TYPE.body }),
  }));
  const lines: Block[] = [];
  for (let i = 0; i < cells.length; i += 2) {
    const pair = cells.slice(i, i + 2);
    lines.push({
      height: Math.max(...pair.map((cell) => cell.text.height)) + 2,
      node: (
        <View style={{ flexDirection: "row", marginBottom: 2 }}>
          {pair.map(({ anchor, text }, index) => (
            <View key={anchor.id} style={{ flexDirection: "row", width: each, marginLeft: index === 0 ? 0 : GAP }}>
              <View style={{ width: MARK, marginRight: 6 }}>
                <AnchorIcon spec={anchor.spec} size={MARK} />
              </View>
              <View style={{ width: each - MARK - 6 }}>{text.node}</View>
            </View>
          ))}
        </View>
      ),
    });
  }
  if (lines.length === 0) return spacer(0);
  const words = "Lean, knot, line and what each holds: see the table overleaf.";
  return stack([spacer(6), ...lines, textBlock(words, width, { size: TYPE.body, weight: 600 })]);
}
