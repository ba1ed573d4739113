/** PNG by its chunks (W3C PNG, third edition, §5): the picture's own stay, texts and Exif go. */

const SIGNATURE = [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a];
const METADATA = new Set(["eXIf", "tEXt", "zTXt", "iTXt", "tIME"]);

export function isPng(bytes: Uint8Array): boolean {
  return SIGNATURE.every((byte, index) => bytes[index] === byte);
}

/** The picture alone, or null when it is not a whole PNG; whatever follows its end goes. */
export function cleanPng(bytes: Uint8Array, keepsMetadata: boolean): Uint8Array | null {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const parts: Uint8Array[] = [bytes.subarray(0, 8)];
  let hasData = false;
  for (let at = 8; at + 12 <= bytes.length;) {
    const end = at + 12 + view.getUint32(at);
    const type = String.fromCharCode(...bytes.subarray(at + 4, at + 8));
    if (end > bytes.length || !/^[A-Za-z]{4}$/.test(type)) return null;
    if (parts.length === 1 && type !== "IHDR") return null;
    if (type === "IDAT") hasData = true;
    if (keepsMetadata || !METADATA.has(type)) parts.push(bytes.subarray(at, end));
    if (type === "IEND") return hasData ? Buffer.concat(parts) : null;
    at = end;
  }
  return null;
}
