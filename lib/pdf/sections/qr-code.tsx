import { Path, Svg } from "@react-pdf/renderer";
import QRCode from "qrcode";
import { INK } from "../theme";
import type { Block } from "./block";

/** Light margin that readers need round the code, modules (ISO/IEC 18004 §6.3.8). */
const QUIET = 4;

/** Dark modules as one path: each run of a row is one rectangle. */
export function qrPath(text: string): { readonly d: string; readonly size: number } {
  const { data, size } = QRCode.create(text, { errorCorrectionLevel: "L" }).modules;
  let d = "";
  for (let row = 0; row < size; row += 1) {
    for (let column = 0; column < size;) {
      let run = 0;
      while (column + run < size && data[row * size + column + run]) run += 1;
      if (run > 0) d += `M${column} ${row}h${run}v1h${-run}z`;
      column += Math.max(1, run);
    }
  }
  return { d, size };
}

/** `side` with its light margin; the code itself is flush with the edges of the block, the margin lies outside. */
export function qrCode(address: string, side: number): { block: Block; side: number } {
  const { d, size } = qrPath(address);
  const inset = (side * QUIET) / (size + 2 * QUIET);
  const drawn = side - 2 * inset;
  return {
    side: drawn,
    block: {
      height: drawn,
      node: (
        <Svg width={drawn} height={drawn} viewBox={`0 0 ${size} ${size}`}>
          <Path d={d} fill={INK} stroke="none" />
        </Svg>
      ),
    },
  };
}
