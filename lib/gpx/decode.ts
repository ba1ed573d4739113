import { GpxFault } from "./types";

/** Pieces of the file go through the decoder one after the other: the whole text is never in memory twice. */
const PIECE_BYTES = 256 * 1024;

function startsWith(bytes: Uint8Array, ...start: readonly number[]): boolean {
  return start.every((byte, index) => bytes[index] === byte);
}

/** The encoding by byte order mark, by the look of the first bytes, or by declaration; UTF-8 when nothing says so. */
function encodingOf(bytes: Uint8Array): string {
  if (startsWith(bytes, 0xff, 0xfe) || startsWith(bytes, 0x3c, 0x00)) return "utf-16le";
  if (startsWith(bytes, 0xfe, 0xff) || startsWith(bytes, 0x00, 0x3c)) return "utf-16be";
  if (startsWith(bytes, 0xef, 0xbb, 0xbf)) return "utf-8";
  const head = new TextDecoder("latin1").decode(bytes.subarray(0, 200));
  const declared = /^\s*<\?xml[^>]*?\sencoding\s*=\s*["']([A-Za-z0-9._-]{1,40})["']/.exec(head)?.[1] ?? "utf-8";
  // It was not written in two bytes a letter, whatever it says.
  return /^utf-?16/i.test(declared) ? "utf-8" : declared;
}

function decoderFor(encoding: string): TextDecoder {
  try {
    return new TextDecoder(encoding, { fatal: true });
  } catch {
    throw new GpxFault(`The file says it is written in "${encoding}", which can't be read here. Save it as UTF-8.`);
  }
}

/** The text of a file, piece by piece, decoded as it declares. Throws GpxFault when its bytes are not that encoding. */
export function* decodePieces(bytes: Uint8Array): Generator<string> {
  const encoding = encodingOf(bytes);
  const decoder = decoderFor(encoding);
  try {
    for (let at = 0; at < bytes.length; at += PIECE_BYTES) {
      yield decoder.decode(bytes.subarray(at, at + PIECE_BYTES), { stream: true });
    }
    yield decoder.decode();
  } catch (error) {
    if (!(error instanceof TypeError)) throw error;
    throw new GpxFault(`The file's letters are not ${encoding.toUpperCase()}, as it says. Save it again as UTF-8.`);
  }
}
