import { inflateSync } from "node:zlib";

const SIGNATURE = 0x774f4646;
const WOFF_HEADER = 44;
const WOFF_ENTRY = 20;
const SFNT_HEADER = 12;
const SFNT_ENTRY = 16;

/**
 * The plain font inside a woff 1.0 file (W3C Recommendation, 2012). The PDF library would read the packed one as well,
 * but unpacks a table again for each letter: a page then takes several times as long.
 */
export function unpackWoff(woff: Buffer): Buffer {
  if (woff.readUInt32BE(0) !== SIGNATURE) throw new Error("This font file is not woff 1.0.");
  const count = woff.readUInt16BE(12);
  const tables = Array.from({ length: count }, (_, index) => {
    const at = WOFF_HEADER + index * WOFF_ENTRY;
    const offset = woff.readUInt32BE(at + 4);
    const packedLength = woff.readUInt32BE(at + 8);
    const length = woff.readUInt32BE(at + 12);
    const packed = woff.subarray(offset, offset + packedLength);
    return {
      tag: woff.subarray(at, at + 4),
      checksum: woff.readUInt32BE(at + 16),
      length,
      data: packedLength < length ? inflateSync(packed) : packed,
    };
  });

  const head = Buffer.alloc(SFNT_HEADER + count * SFNT_ENTRY);
  const powerOfTwo = 2 ** Math.floor(Math.log2(count));
  woff.copy(head, 0, 4, 8);
  head.writeUInt16BE(count, 4);
  head.writeUInt16BE(powerOfTwo * 16, 6);
  head.writeUInt16BE(Math.log2(powerOfTwo), 8);
  head.writeUInt16BE((count - powerOfTwo) * 16, 10);
  const parts: Buffer[] = [head];
  let offset = head.length;
  tables.forEach((table, index) => {
    const at = SFNT_HEADER + index * SFNT_ENTRY;
    table.tag.copy(head, at);
    head.writeUInt32BE(table.checksum, at + 4);
    head.writeUInt32BE(offset, at + 8);
    head.writeUInt32BE(table.length, at + 12);
    const padding = Buffer.alloc((4 - (table.length % 4)) % 4);
    parts.push(table.data, padding);
    offset += table.length + padding.length;
  });
  return Buffer.concat(parts);
}

const POSTSCRIPT_NAME = 6;
const WINDOWS = 3;

/**
 * Changes one letter of a font's PostScript name, in place (OpenType `name` table). The files of a family share one
 * name, and the PDF library takes two fonts of one name for two strangers: it would embed the second again for each text.
 */
export function markPostscriptName(font: Buffer, mark: string): void {
  const tableCount = font.readUInt16BE(4);
  for (let index = 0; index < tableCount; index += 1) {
    const entry = SFNT_HEADER + index * SFNT_ENTRY;
    if (font.toString("latin1", entry, entry + 4) !== "name") continue;
    const table = font.readUInt32BE(entry + 8);
    const recordCount = font.readUInt16BE(table + 2);
    const strings = table + font.readUInt16BE(table + 4);
    for (let i = 0; i < recordCount; i += 1) {
      const record = table + 6 + i * 12;
      if (font.readUInt16BE(record + 6) !== POSTSCRIPT_NAME) continue;
      const at = strings + font.readUInt16BE(record + 10);
      // UTF-16 on Windows: the letter is the second byte.
      font.write(mark, font.readUInt16BE(record) === WINDOWS ? at + 1 : at, 1, "latin1");
    }
  }
}
