const HOME = "/trips";
const OWN = "https://own.invalid";

/** Where to go after signing in: only a path of our own, whatever was put into the address. */
export function toOwnPath(next: unknown): string {
  if (typeof next !== "string" || next.length > 500 || !/^\/(?![/\\])[\x21-\x7e]*$/.test(next) || next.includes("\\")) {
    return HOME;
  }
  if (!URL.canParse(next, OWN)) return HOME;
  const url = new URL(next, OWN);
  if (url.origin !== OWN || url.pathname.startsWith("//")) return HOME;
  return `${url.pathname}${url.search}${url.hash}`;
}
