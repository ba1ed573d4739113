import { AppError } from "@/lib/errors";

function describeLimit(maxBytes: number): string {
  return maxBytes < 1024 * 1024 ? `${Math.floor(maxBytes / 1024)} kB` : `${Math.floor(maxBytes / 1024 / 1024)} MB`;
}

/** The body as it is, never more than `maxBytes` of it in memory. */
export async function readBytes(request: Request, maxBytes: number): Promise<Uint8Array> {
  const tooLarge = () => new AppError("too-large", `That is too large: at most ${describeLimit(maxBytes)}.`);
  if (Number(request.headers.get("content-length") ?? 0) > maxBytes) throw tooLarge();
  if (!request.body) return new Uint8Array();
  const parts: Uint8Array[] = [];
  let size = 0;
  const reader = request.body.getReader();
  for (;;) {
    const { done, value } = await reader.read();
    if (done) break;
    size += value.byteLength;
    if (size > maxBytes) {
      await reader.cancel().catch(() => undefined);
      throw tooLarge();
    }
    parts.push(value);
  }
  return Buffer.concat(parts);
}

/** The body as text, by the same limit. */
export async function readText(request: Request, maxBytes: number): Promise<string> {
  const bytes = await readBytes(request, maxBytes);
  try {
    return new TextDecoder("utf-8", { fatal: true }).decode(bytes);
  } catch {
    throw new AppError("bad-input", "That is not UTF-8 text.");
  }
}

export async function readJson(request: Request, maxBytes: number): Promise<unknown> {
  const type = request.headers.get("content-type") ?? "";
  if (!/^application\/json\s*(;|$)/i.test(type)) throw new AppError("bad-input", "Send JSON (application/json).");
  const text = await readText(request, maxBytes);
  try {
    return JSON.parse(text) as unknown;
  } catch {
    throw new AppError("bad-input", "That is not JSON.");
  }
}
