import { z } from "zod";
import { pullTestRefInput } from "@/lib/domain/pull-test/schema";
import { contentDisposition } from "@/lib/http/content-disposition";
import { readBytes } from "@/lib/http/read-body";
import { route } from "@/lib/http/route";
import { getPhoto } from "@/lib/services/pull-tests/photo/get-photo";
import { deletePhoto, savePhoto } from "@/lib/services/pull-tests/photo/save-photo";

const MAX_PHOTO_BYTES = 5 * 1024 * 1024;

export const GET = route({
  params: pullTestRefInput,
  handler: async ({ ctx, params }) => {
    const { id, contentType, content } = await getPhoto({ ctx, input: params });
    return new Response(new Uint8Array(content), {
      headers: {
        "Content-Type": contentType,
        "Content-Disposition": contentDisposition("inline", `${id}.${contentType.slice(6)}`),
        "Content-Length": String(content.byteLength),
        "X-Content-Type-Options": "nosniff",
      },
    });
  },
});

/** The photo itself as the body; ?keepPosition=1 keeps where and when it was taken. */
export const PUT = route({
  params: pullTestRefInput,
  query: z.object({ keepPosition: z.enum(["0", "1"], { error: "Say 0 or 1." }).default("0") }),
  handler: async ({ ctx, params, query, request }) => {
    const content = await readBytes(request, MAX_PHOTO_BYTES);
    return savePhoto({ ctx, input: { ...params, keepsPosition: query.keepPosition === "1", content } });
  },
});

export const DELETE = route({
  params: pullTestRefInput,
  handler: async ({ ctx, params }) => {
    await deletePhoto({ ctx, input: params });
    return {};
  },
});
