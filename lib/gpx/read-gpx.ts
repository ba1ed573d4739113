import { SaxesParser, type SaxesTagPlain } from "saxes";
import { decodePieces } from "./decode";
import { GpxBuilder, type PointTag } from "./gpx-builder";
import { GpxFault, type GpxFile } from "./types";

/** Deeper than any file of a device; a hostile one must not fill the stack. */
const MAX_DEPTH = 40;
/** Of one element's text; longer names and notes are cut. */
const MAX_TEXT = 4000;
/** White space before the first mark belongs to no XML file, but some programs write it. */
const LEADING_SPACE = /^\s+/;

/** Not an object: a file may have a part that is called "constructor". */
const POINT_TAGS: ReadonlyMap<string, PointTag> = new Map([
  ["trkpt", "trkpt"],
  ["rtept", "rtept"],
  ["wpt", "wpt"],
]);

/** Walks through the tags of one file and hands what counts to the builder. */
class GpxReader {
  private readonly parser = new SaxesParser();
  private readonly builder = new GpxBuilder();
  /** Names of the open elements, without the prefix of the root; foreign ones are "". */
  private readonly open: string[] = [];
  private prefix = "";
  private text = "";

  constructor() {
    this.parser.on("doctype", () => this.refuse("a DOCTYPE, which a GPX file never needs"));
    this.parser.on("error", (error) => {
      const reason = error.message.replace(/^(undefined:)?\d+:\d+:\s*/, "");
      throw new GpxFault(`Line ${this.parser.line} is not XML: ${reason.slice(0, 120)}`);
    });
    this.parser.on("opentag", (tag) => this.enter(tag));
    this.parser.on("closetag", () => this.leave());
    this.parser.on("text", (text) => this.addText(text));
    this.parser.on("cdata", (text) => this.addText(text));
  }

  private refuse(what: string): never {
    throw new GpxFault(`Line ${this.parser.line} has ${what}.`);
  }

  write(piece: string): void {
    this.parser.write(piece);
  }

  close(): GpxFile {
    this.parser.close();
    return this.builder.finish();
  }

  private addText(text: string): void {
    if (this.text.length < MAX_TEXT) this.text += text;
  }

  /** "trkpt" for <trkpt> and <g:trkpt> where the root is <g:gpx>; "" for everything of another vocabulary. */
  private localName(name: string): string {
    if (this.prefix === "") return name.includes(":") ? "" : name;
    return name.startsWith(this.prefix) ? name.slice(this.prefix.length) : "";
  }

  private enterRoot(tag: SaxesTagPlain): void {
    const [before, local] = tag.name.includes(":") ? tag.name.split(":", 2) : ["", tag.name];
    if (local !== "gpx") throw new GpxFault(`This is not a GPX file: it begins with <${tag.name.slice(0, 60)}>.`);
    this.prefix = before ? `${before}:` : "";
    const version = tag.attributes.version;
    if (version !== "1.1" && version !== "1.0") {
      this.builder.remark(
        `It calls itself GPX ${(version ?? "without a version").slice(0, 20)}; it was read as GPX 1.1.`,
      );
    }
  }

  private enter(tag: SaxesTagPlain): void {
    if (this.open.length >= MAX_DEPTH) this.refuse("more parts inside parts than a GPX file can have");
    if (this.open.length === 0) {
      this.enterRoot(tag);
      this.open.push("gpx");
      return;
    }
    const parent = this.open[this.open.length - 1] ?? "";
    // Whatever lies inside a foreign part is foreign.
    const name = parent === "" || parent === "extensions" ? "" : this.localName(tag.name);
    this.open.push(name);
    this.text = "";
    const point = POINT_TAGS.get(name);
    if (point) this.builder.openPoint(point, tag.attributes, this.parser.line);
    else if (name === "trk" || name === "rte") this.builder.openLine(name);
    else if (name === "trkseg") this.builder.openSegment();
  }

  private leave(): void {
    const name = this.open.pop() ?? "";
    const parent = this.open[this.open.length - 1] ?? "";
    const text = this.text.trim();
    this.text = "";
    if (name === "") return;
    if (POINT_TAGS.has(name)) this.builder.closePoint();
    else if (name === "trk" || name === "rte") this.builder.closeLine();
    else if (name === "ele" && POINT_TAGS.has(parent)) this.builder.setHeight(text, this.parser.line);
    else if (name === "name") this.builder.setName(parent, text, this.open.length === 1);
    else if ((name === "desc" || name === "cmt") && parent === "wpt") this.builder.setNote(text);
  }
}

/**
 * Reads a GPX 1.0 or 1.1 file as a stream. Times, extensions and whatever is not a line or a place are passed over.
 * Throws GpxFault with the line or the point when it can't be read as it should.
 */
export function readGpx(bytes: Uint8Array): GpxFile {
  const reader = new GpxReader();
  let isFirst = true;
  for (const piece of decodePieces(bytes)) {
    const text = isFirst ? piece.replace(LEADING_SPACE, "") : piece;
    if (text !== "") isFirst = false;
    reader.write(text);
  }
  if (isFirst) throw new GpxFault("The file is empty.");
  return reader.close();
}
