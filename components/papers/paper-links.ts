import type { PaperFold, PaperSize } from "@/lib/domain/paper/schema";

type PaperRef =
  | { readonly paper: "field-card"; readonly campId: string }
  | { readonly paper: "pitch-card"; readonly campId: string; readonly pitchId: string }
  | { readonly paper: "pack-list"; readonly personId: string }
  | { readonly paper: "pitch-and-pack"; readonly personId: string; readonly fold: PaperFold }
  | { readonly paper: "booklet" };

/** Address of a piece of paper as PDF. */
export function paperHref(tripId: string, ref: PaperRef, size: PaperSize): string {
  return `/api/trips/${tripId}/papers?${new URLSearchParams({ ...ref, size }).toString()}`;
}
