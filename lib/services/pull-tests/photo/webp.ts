/** WebP by its chunks (RFC 9649): a RIFF file; Exif and XMP go, and the flags that announce them. */

const EXIF_AND_XMP_FLAGS = 0x08 | 0x04;

const textAt = (bytes: Uint8Array, at: number) => String.fromCharCode(...bytes.subarray(at, at + 4));

export function isWebp(bytes: Uint8Array): boolean {
  return textAt(bytes, 0) === "RIFF" && textAt(bytes, 8) === "WEBP";
}

function withoutFlags(chunk: Uint8Array): Uint8Array {
  const copy = Uint8Array.from(chunk);
  copy[8] = (copy[8] ?? 0) & ~EXIF_AND_XMP_FLAGS;
  return copy;
}

/** The picture alone, or null when it is not a whole WebP; whatever follows its end goes. */
export function cleanWebp(bytes: Uint8Array, keepsMetadata: boolean): Uint8Array | null {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  if (bytes.length < 20) return null;
  const fileEnd = 8 + view.getUint32(4, true);
  if (fileEnd > bytes.length) return null;
  const parts: Uint8Array[] = [];
  let hasPicture = false;
  for (let at = 12; at + 8 <= fileEnd;) {
    const size = view.getUint32(at + 4, true);
    const end = at + 8 + size + (size % 2);
    if (end > fileEnd) return null;
    const type = textAt(bytes, at);
    const chunk = bytes.subarray(at, end);
    if (["VP8 ", "VP8L", "ANMF"].includes(type)) hasPicture = true;
    if (keepsMetadata) parts.push(chunk);
    else if (type === "VP8X") parts.push(withoutFlags(chunk));
    else if (type !== "EXIF" && type !== "XMP ") parts.push(chunk);
    at = end;
  }
  if (!hasPicture) return null;
  const body = Buffer.concat(parts);
  const header = Buffer.alloc(12);
  header.write("RIFF", 0, "latin1");
  header.writeUInt32LE(body.length + 4, 4);
  header.write("WEBP", 8, "latin1");
  return Buffer.concat([header, body]);
}
