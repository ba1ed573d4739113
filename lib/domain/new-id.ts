const ALPHABET = "0123456789abcdefghijkmnpqrstuvwxyz";

/** A random identifier of 26 letters and digits out of 34: 132 bits. Works on the server and in the browser. */
export function newId(): string {
  let id = "";
  while (id.length < 26) {
    for (const byte of crypto.getRandomValues(new Uint8Array(32))) {
      // 238 = 7 × 34: bytes above it would make some letters likelier than others.
      if (byte < 238 && id.length < 26) id += ALPHABET[byte % 34];
    }
  }
  return id;
}
