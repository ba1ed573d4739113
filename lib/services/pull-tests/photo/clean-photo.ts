import { AppError } from "@/lib/errors";
import { cleanJpeg, isJpeg } from "./jpeg";
import { cleanPng, isPng } from "./png";
import { cleanWebp, isWebp } from "./webp";

const KINDS = [
  { contentType: "image/jpeg", is: isJpeg, clean: cleanJpeg },
  { contentType: "image/png", is: isPng, clean: cleanPng },
  { contentType: "image/webp", is: isWebp, clean: cleanWebp },
] as const;

export interface CleanPhoto {
  readonly contentType: (typeof KINDS)[number]["contentType"];
  readonly content: Uint8Array;
}

/** What a file is, is said by its content alone. Where and when it was taken goes unless it is kept on purpose. */
export function cleanPhoto(bytes: Uint8Array, keepsPosition: boolean): CleanPhoto {
  const kind = KINDS.find((one) => one.is(bytes));
  if (!kind) throw new AppError("bad-input", "That is not a JPEG, PNG or WebP photo. Nothing was saved.");
  const content = kind.clean(bytes, keepsPosition);
  if (!content) throw new AppError("bad-input", "That photo is damaged or cut off. Nothing was saved.");
  return { contentType: kind.contentType, content };
}
