import { beforeAll, describe, expect, it } from "vitest";
import type { Browser } from "../../helpers/browser";
import { ORIGIN } from "../../helpers/browser";
import { TINY_PNG } from "../../helpers/pulls";
import { refusalOf } from "../../helpers/refusals";
import { hashTables } from "../../helpers/table-hash";
import { makeTwoTrips, type TwoTrips } from "../../helpers/two-trips";
import { DELETE, GET, PUT } from "@/app/api/pull-tests/[pullTestId]/photo/route";
import { cleanPhoto } from "@/lib/services/pull-tests/photo/clean-photo";
import { savePhoto } from "@/lib/services/pull-tests/photo/save-photo";

const SECRET = "59.9139N-here-I-live";
const secret = Buffer.from(SECRET, "latin1");

/** Exif of orientation 6 with a text that gives the place away. */
function exifSegment(): Buffer {
  const tiff = Buffer.alloc(26);
  tiff.write("MM\u0000*", 0, "latin1");
  tiff.writeUInt32BE(8, 4);
  tiff.writeUInt16BE(1, 8);
  tiff.writeUInt16BE(0x0112, 10);
  tiff.writeUInt16BE(3, 12);
  tiff.writeUInt32BE(1, 14);
  tiff.writeUInt16BE(6, 18);
  return segment(0xe1, Buffer.concat([Buffer.from("Exif\u0000\u0000", "latin1"), tiff, secret]));
}

function segment(marker: number, payload: Buffer): Buffer {
  const head = Buffer.from([0xff, marker, 0, 0]);
  head.writeUInt16BE(payload.length + 2, 2);
  return Buffer.concat([head, payload]);
}

const SCAN = Buffer.concat([
  segment(0xda, Buffer.from([1, 1, 0, 0, 63, 0])),
  Buffer.from([0x12, 0xff, 0x00, 0xff, 0xd0, 0x34]),
]);

function jpeg(...segments: Buffer[]): Buffer {
  const jfif = segment(0xe0, Buffer.from("JFIF\u0000\u0001\u0001\u0000\u0000\u0001\u0000\u0001\u0000\u0000", "latin1"));
  return Buffer.concat([Buffer.from([0xff, 0xd8]), jfif, ...segments, SCAN, Buffer.from([0xff, 0xd9])]);
}

function pngWith(type: string, data: Buffer): Buffer {
  const chunk = Buffer.alloc(12 + data.length);
  chunk.writeUInt32BE(data.length, 0);
  chunk.write(type, 4, "latin1");
  data.copy(chunk, 8);
  return Buffer.concat([TINY_PNG.subarray(0, 33), chunk, TINY_PNG.subarray(33)]);
}

function webp(...chunks: [string, Buffer][]): Buffer {
  const body = Buffer.concat(
    chunks.map(([type, data]) => {
      const head = Buffer.alloc(8);
      head.write(type, 0, "latin1");
      head.writeUInt32LE(data.length, 4);
      return Buffer.concat([head, data, Buffer.alloc(data.length % 2)]);
    }),
  );
  const head = Buffer.alloc(12);
  head.write("RIFF", 0, "latin1");
  head.writeUInt32LE(body.length + 4, 4);
  head.write("WEBP", 8, "latin1");
  return Buffer.concat([head, body]);
}

const has = (bytes: Uint8Array, text: string) => Buffer.from(bytes).includes(Buffer.from(text, "latin1"));

describe("a photo", () => {
  const vp8x = Buffer.from([0x0c, 0, 0, 0, 0, 0, 0, 0, 0, 0]);
  const files: [string, Buffer, string][] = [
    [
      "JPEG with Exif, XMP, comment and a tail",
      Buffer.concat([jpeg(exifSegment(), segment(0xe1, secret), segment(0xfe, secret)), secret]),
      "image/jpeg",
    ],
    ["PNG with Exif", pngWith("eXIf", secret), "image/png"],
    ["PNG with text and a tail", Buffer.concat([pngWith("iTXt", secret), secret]), "image/png"],
    [
      "WebP with Exif and XMP",
      webp(["VP8X", vp8x], ["VP8 ", Buffer.from("picture")], ["EXIF", secret], ["XMP ", secret]),
      "image/webp",
    ],
  ];

  it.each(files)("%s loses where it was taken and stays a photo", (_, file, type) => {
    const { contentType, content } = cleanPhoto(file, false);
    expect(contentType).toBe(type);
    expect(has(content, SECRET)).toBe(false);
    // Cleaning what is clean changes nothing.
    expect(Buffer.from(cleanPhoto(content, false).content)).toEqual(Buffer.from(content));
  });

  it("keeps which way up it is, and its picture to the last byte", () => {
    const { content } = cleanPhoto(jpeg(exifSegment()), false);
    expect(has(content, "Exif")).toBe(true);
    expect(Buffer.from(content).includes(SCAN)).toBe(true);
    expect(Buffer.from(content).includes(Buffer.from([0x01, 0x12, 0x00, 0x03, 0, 0, 0, 1, 0, 6]))).toBe(true);
  });

  it("announces no metadata that is no longer there", () => {
    const { content } = cleanPhoto(webp(["VP8X", vp8x], ["VP8 ", Buffer.from("picture")], ["EXIF", secret]), false);
    expect(content[20]).toBe(0);
  });

  it("keeps where it was taken on purpose, but never a tail", () => {
    const { content } = cleanPhoto(Buffer.concat([jpeg(exifSegment()), Buffer.from("<script>tail</script>")]), true);
    expect(has(content, SECRET)).toBe(true);
    expect(has(content, "tail")).toBe(false);
  });

  it.each<[string, Buffer]>([
    ["an SVG", Buffer.from('<svg xmlns="http://www.w3.org/2000/svg" onload="alert(1)"/>')],
    ["a page", Buffer.from("<!doctype html><script>alert(1)</script>")],
    ["a GIF", Buffer.from("GIF89a\u0001\u0000")],
    ["nothing", Buffer.alloc(0)],
    ["a JPEG that is cut off", jpeg(exifSegment()).subarray(0, 60)],
    ["a JPEG of its first bytes only", Buffer.from([0xff, 0xd8, 0xff])],
    ["a JPEG without a picture", Buffer.from([0xff, 0xd8, 0xff, 0xd9])],
    ["a PNG that is cut off", Buffer.from(TINY_PNG.subarray(0, 40))],
    ["a PNG with a length beyond its end", pngWith("tEXt", secret).subarray(0, 44)],
    ["a WebP that claims to be longer", webp(["VP8 ", Buffer.from("picture")]).subarray(0, 20)],
    ["a page that begins like a JPEG", Buffer.concat([Buffer.from([0xff, 0xd8, 0xff]), Buffer.from("<html>")])],
  ])("%s is refused, whatever it is called", async (_, file) => {
    const refusal = await refusalOf(Promise.resolve().then(() => cleanPhoto(file, false)));
    expect(refusal.code).toBe("bad-input");
  });
});

describe("the photo of a reading", () => {
  let given: TwoTrips;

  beforeAll(async () => {
    given = await makeTwoTrips();
  });

  const call = (handler: typeof PUT, who: Browser, init: RequestInit & { query?: string } = {}) =>
    handler(
      new Request(`${ORIGIN}/api/x${init.query ?? ""}`, {
        ...init,
        headers: who.headers(init.headers as Record<string, string> | undefined),
        ...(init.body instanceof ReadableStream ? { duplex: "half" } : {}),
      }),
      { params: Promise.resolve({ pullTestId: given.a.pullTestId }) },
    );

  it("is served by its content, as a file of its own name, to leader and co-leader only", async () => {
    const { browsers } = given;
    const answer = await call(GET, browsers.coLeader);
    expect(answer.status).toBe(200);
    expect(answer.headers.get("content-type")).toBe("image/png");
    expect(answer.headers.get("x-content-type-options")).toBe("nosniff");
    expect(answer.headers.get("content-disposition")).toMatch(/^inline; filename="[0-9a-z]{26}\.png"/);
    expect(new Uint8Array(await answer.arrayBuffer())).toEqual(TINY_PNG);
    expect((await call(GET, browsers.participant)).status).toBe(403);
    expect((await call(GET, browsers.otherLeader)).status).toBe(404);
    expect((await call(GET, browsers.nobody)).status).toBe(401);
  });

  it("of 200 MB, said or not said beforehand, is refused and nothing is stored", async () => {
    const { leader } = given.browsers;
    const before = await hashTables();
    const long = await call(PUT, leader, { method: "PUT", body: "x", headers: { "content-length": "209715200" } });
    expect(long.status).toBe(413);
    let chunks = 0;
    const endless = new ReadableStream<Uint8Array>({
      pull(controller) {
        chunks += 1;
        controller.enqueue(new Uint8Array(1024 * 1024));
      },
    });
    const answer = await call(PUT, leader, { method: "PUT", body: endless });
    expect(answer.status).toBe(413);
    expect(((await answer.json()) as { error: { message: string } }).error.message).toMatch(/at most 5 MB/);
    expect(chunks).toBeLessThan(9);
    expect(await hashTables()).toEqual(before);
  });

  it("that is a page named .jpg is refused and nothing is stored; a good one replaces, and goes", async () => {
    const { leader } = given.browsers;
    const before = await hashTables();
    const headers = { "content-type": "image/jpeg" };
    expect((await call(PUT, leader, { method: "PUT", body: "<svg onload=alert(1)>", headers })).status).toBe(400);
    expect((await call(PUT, leader, { method: "PUT", body: TINY_PNG, query: "?keepPosition=yes" })).status).toBe(400);
    expect(await hashTables()).toEqual(before);
    const photo = new Uint8Array(jpeg(exifSegment()));
    expect((await call(PUT, leader, { method: "PUT", body: photo })).status).toBe(200);
    const answer = await call(GET, leader);
    expect(answer.headers.get("content-type")).toBe("image/jpeg");
    expect(has(new Uint8Array(await answer.arrayBuffer()), SECRET)).toBe(false);
    expect((await call(DELETE, leader, { method: "DELETE" })).status).toBe(200);
    expect((await call(GET, leader)).status).toBe(404);
  });

  it("can't be put on another trip's reading", async () => {
    const { ctx } = given.users.otherLeader;
    const input = { pullTestId: given.a.pullTestId, keepsPosition: false, content: TINY_PNG };
    expect((await refusalOf(savePhoto({ ctx, input }))).code).toBe("not-found");
  });
});
