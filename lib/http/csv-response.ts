import { contentDisposition } from "./content-disposition";

/** A table to be saved, never to be shown as a page. */
export function csvResponse({ fileName, text }: { readonly fileName: string; readonly text: string }): Response {
  return new Response(text, {
    headers: {
      "Content-Type": "text/csv; charset=utf-8",
      "Content-Disposition": contentDisposition("attachment", fileName),
      "X-Content-Type-Options": "nosniff",
    },
  });
}
