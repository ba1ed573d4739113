import { createCipheriv, createDecipheriv, randomBytes } from "node:crypto";
import { env } from "@/lib/env";
import { AppError } from "@/lib/errors";

const NONCE_BYTES = 12;
const TAG_BYTES = 16;

/** Where the text belongs: opened anywhere else, it is refused. */
export interface SealedPlace {
  readonly rowId: string;
  readonly personId: string;
  readonly tripId: string;
}

const toAad = ({ rowId, personId, tripId }: SealedPlace) => Buffer.from(`details ${rowId} ${personId} ${tripId}`);

/** AES-256-GCM under the first key of the settings: "key id.nonce.tag.ciphertext". */
export function seal(text: string, place: SealedPlace): string {
  const [current] = env.detailsKeys;
  if (!current) throw new Error("There is no key for details.");
  const nonce = randomBytes(NONCE_BYTES);
  const cipher = createCipheriv("aes-256-gcm", current.key, nonce, { authTagLength: TAG_BYTES });
  cipher.setAAD(toAad(place));
  const body = Buffer.concat([cipher.update(text, "utf8"), cipher.final()]);
  return [current.id, ...[nonce, cipher.getAuthTag(), body].map((part) => part.toString("base64url"))].join(".");
}

export function isSealedWithCurrentKey(sealed: string): boolean {
  return sealed.startsWith(`${env.detailsKeys[0]?.id}.`);
}

const UNREADABLE = "These details can't be read with the keys that this server has. Ask whoever runs it.";

/** The text again; a refusal when the key is not there, or when anything of it or its place was changed. */
export function unseal(sealed: string, place: SealedPlace): string {
  const [keyId = "", ...parts] = sealed.split(".");
  const [nonce, tag, body] = parts.map((part) => Buffer.from(part, "base64url"));
  const known = env.detailsKeys.find((one) => one.id === keyId);
  if (!known || !nonce || !tag || !body || nonce.length !== NONCE_BYTES || tag.length !== TAG_BYTES) {
    throw new AppError("unavailable", UNREADABLE);
  }
  try {
    const decipher = createDecipheriv("aes-256-gcm", known.key, nonce, { authTagLength: TAG_BYTES });
    decipher.setAAD(toAad(place));
    decipher.setAuthTag(tag);
    return Buffer.concat([decipher.update(body), decipher.final()]).toString("utf8");
  } catch {
    throw new AppError("unavailable", UNREADABLE);
  }
}
