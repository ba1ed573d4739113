/** Marks that RFC 8187 leaves unencoded are fewer than those that encodeURIComponent leaves. */
function encodeExtended(text: string): string {
  return encodeURIComponent(text).replace(
    /['()*]/g,
    (mark) => `%${mark.charCodeAt(0).toString(16).toUpperCase().padStart(2, "0")}`,
  );
}

/** Content-Disposition by RFC 6266: a plain name for old programs, the true one in UTF-8 beside it. */
export function contentDisposition(kind: "inline" | "attachment", fileName: string): string {
  // Lone surrogates can't be encoded; slashes and control characters have no place in a file name.
  const words = fileName
    .replaceAll('"', "")
    .replace(/[\p{Cc}\p{Surrogate}\\/:*?<>|]/gu, " ")
    .replace(/\s+/g, " ")
    .trim();
  const clean = [...words].slice(0, 150).join("");
  const plain = clean
    .normalize("NFKD")
    .replace(/\p{M}/gu, "")
    .replace(/[^\x20-\x7E]/g, "_");
  return `${kind}; filename="${plain}"; filename*=UTF-8''${encodeExtended(clean)}`;
}
