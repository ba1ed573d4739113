/** JPEG by its segments (ITU-T T.81, Annex B): which are kept, and where the picture ends. */

const SOI = 0xd8;
const EOI = 0xd9;
const SOS = 0xda;
const APP0 = 0xe0;
const APP1 = 0xe1;
const APP2 = 0xe2;
const APP14 = 0xee;
const APP15 = 0xef;
const COMMENT = 0xfe;
const ORIENTATION_TAG = 0x0112;

export function isJpeg(bytes: Uint8Array): boolean {
  return bytes[0] === 0xff && bytes[1] === SOI && bytes[2] === 0xff;
}

/** Without parameters: restart marks, start and end of the picture, and the lone TEM. */
const isBare = (marker: number) => (marker >= 0xd0 && marker <= EOI) || marker === 0x01;

const isText = (bytes: Uint8Array, at: number, text: string) =>
  [...text].every((letter, index) => bytes[at + index] === letter.charCodeAt(0));

/** Colour profile and colour transform stay; what says who, when and where does not. */
function isKept(marker: number, bytes: Uint8Array, payload: number): boolean {
  if (marker === APP0 || marker === APP14) return true;
  if (marker === APP2) return isText(bytes, payload, "ICC_PROFILE");
  return !(marker >= APP1 && marker <= APP15) && marker !== COMMENT;
}

/** Which way up, 1…8, from the Exif block that begins at `payload`; null when it doesn't say. */
function readOrientation(bytes: Uint8Array, payload: number, end: number): number | null {
  if (!isText(bytes, payload, "Exif")) return null;
  const tiff = payload + 6;
  if (tiff + 8 > end) return null;
  const view = new DataView(bytes.buffer, bytes.byteOffset + tiff, end - tiff);
  const isLittle = view.getUint16(0) === 0x4949;
  const first = view.getUint32(4, isLittle);
  if (first + 2 > view.byteLength) return null;
  const count = view.getUint16(first, isLittle);
  for (let entry = 0; entry < count; entry++) {
    const at = first + 2 + entry * 12;
    if (at + 12 > view.byteLength) return null;
    if (view.getUint16(at, isLittle) !== ORIENTATION_TAG) continue;
    const value = view.getUint16(at + 8, isLittle);
    return value >= 1 && value <= 8 ? value : null;
  }
  return null;
}

/** An Exif block that says nothing but which way up. */
function orientationSegment(orientation: number): Uint8Array {
  // prettier-ignore
  return Uint8Array.from([
    0xff, APP1, 0x00, 0x22, 0x45, 0x78, 0x69, 0x66, 0x00, 0x00,
    0x4d, 0x4d, 0x00, 0x2a, 0x00, 0x00, 0x00, 0x08,
    0x00, 0x01,
    0x01, 0x12, 0x00, 0x03, 0x00, 0x00, 0x00, 0x01, 0x00, orientation, 0x00, 0x00,
    0x00, 0x00, 0x00, 0x00,
  ]);
}

/** Index after the entropy-coded data that begins at `at`: the next mark that is neither stuffing nor a restart. */
function skipScan(bytes: Uint8Array, at: number): number {
  for (let i = at; i + 1 < bytes.length; i++) {
    const next = bytes[i + 1] ?? 0;
    if (bytes[i] === 0xff && next !== 0x00 && next !== 0xff && !(next >= 0xd0 && next <= 0xd7)) return i;
  }
  return bytes.length;
}

/**
 * The picture alone, or null when it is not a whole JPEG. Metadata goes unless it is kept on purpose; whatever follows
 * the end of the picture goes in any case.
 */
export function cleanJpeg(bytes: Uint8Array, keepsMetadata: boolean): Uint8Array | null {
  const parts: Uint8Array[] = [bytes.subarray(0, 2)];
  let orientation: number | null = null;
  let hasScan = false;
  let at = 2;
  while (at + 1 < bytes.length) {
    if (bytes[at] !== 0xff) return null;
    const marker = bytes[at + 1] ?? 0;
    if (marker === 0xff) {
      at += 1;
      continue;
    }
    if (marker === EOI) {
      if (!hasScan) return null;
      if (!keepsMetadata && orientation !== null && orientation !== 1) {
        parts.splice(1, 0, orientationSegment(orientation));
      }
      return Buffer.concat([...parts, bytes.subarray(at, at + 2)]);
    }
    if (isBare(marker)) return null;
    const payload = at + 4;
    const end = at + 2 + (((bytes[at + 2] ?? 0) << 8) | (bytes[at + 3] ?? 0));
    if (end < payload || end > bytes.length) return null;
    if (marker === APP1) orientation ??= readOrientation(bytes, payload, end);
    const next = marker === SOS ? skipScan(bytes, end) : end;
    if (marker === SOS) hasScan = true;
    if (keepsMetadata || isKept(marker, bytes, payload)) parts.push(bytes.subarray(at, next));
    at = next;
  }
  return null;
}
