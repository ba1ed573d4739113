/** Deeper than any form of ours; a name of a million dots must not become a million objects. */
const MAX_DEPTH = 12;

/**
 * Reads a form into a nested object. Names are dotted paths; a suffix says how the text is read:
 * "details.altitudeM:number" (decimal point or comma; empty = null), "hasRocks:boolean", "spec:json".
 * Text that is not a number stays text, so that the schema names the field. What came as JSON is one value: no other
 * field reaches into it.
 */
export function readFormData(form: FormData): Record<string, unknown> {
  const root: Record<string, unknown> = Object.create(null) as Record<string, unknown>;
  for (const [name, entry] of form.entries()) {
    if (typeof entry !== "string" || name.startsWith("$ACTION")) continue;
    const [path = "", kind = "text"] = name.split(":");
    const keys = path.split(".", MAX_DEPTH + 1);
    if (keys.length > MAX_DEPTH) continue;
    if (keys.some((key) => !/^[A-Za-z0-9-]{1,60}$/.test(key) || key === "constructor" || key === "prototype")) continue;
    setAt(root, keys, readValue(entry, kind));
  }
  return plain(root) as Record<string, unknown>;
}

const MAX_NUMBER_LENGTH = 100;

/** A decimal number with point or comma, or null when empty, or the text itself when it is neither. */
export function readDecimal(text: string): number | null | string {
  if (text.length > MAX_NUMBER_LENGTH) return text;
  const trimmed = text.trim().replace(/\s/g, "");
  if (trimmed === "") return null;
  const normal = trimmed.replace(",", ".").replace(/^\u2212/, "-");
  return /^[+-]?(\d+(\.\d*)?|\.\d+)$/.test(normal) ? Number(normal) : text;
}

function readValue(text: string, kind: string): unknown {
  switch (kind) {
    case "number":
      return readDecimal(text);
    case "boolean":
      return text === "true" || text === "on";
    case "nullable":
      return text === "" ? null : text;
    case "json":
      try {
        return JSON.parse(text) as unknown;
      } catch {
        return text;
      }
    default:
      return text;
  }
}

/** Made here from dotted names, not read from JSON: only these have no prototype. */
function isBranch(value: unknown): value is Record<string, unknown> {
  return typeof value === "object" && value !== null && Object.getPrototypeOf(value) === null;
}

function setAt(root: Record<string, unknown>, keys: readonly string[], value: unknown): void {
  let at = root;
  keys.forEach((key, index) => {
    if (index === keys.length - 1) {
      at[key] = value;
      return;
    }
    const next = at[key];
    if (isBranch(next)) at = next;
    else at = at[key] = Object.create(null) as Record<string, unknown>;
  });
}

/** Branches whose keys are 0, 1, 2 … become lists. */
function plain(value: unknown): unknown {
  if (!isBranch(value)) return value;
  const entries = Object.entries(value);
  if (entries.length > 0 && entries.every(([key], index) => key === String(index))) {
    return entries.map(([, one]) => plain(one));
  }
  return Object.fromEntries(entries.map(([key, one]) => [key, plain(one)]));
}
