import { contentDisposition } from "./content-disposition";

/** A paper that the browser shows by itself. */
export function pdfResponse({
  fileName,
  content,
}: {
  readonly fileName: string;
  readonly content: Uint8Array;
}): Response {
  return new Response(new Uint8Array(content), {
    headers: {
      "Content-Type": "application/pdf",
      "Content-Disposition": contentDisposition("inline", fileName),
      "Content-Length": String(content.byteLength),
      "X-Content-Type-Options": "nosniff",
    },
  });
}
