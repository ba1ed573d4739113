import { contentDisposition } from "@/lib/http/content-disposition";
import { errorResponse, NO_STORE } from "@/lib/http/error-response";
import { newId } from "@/lib/domain/ids";
import { getCapturedFile } from "@/lib/services/post/read-captured-mail";

export const dynamic = "force-dynamic";

interface Segment {
  readonly params: Promise<{ id: string; n: string }>;
}

export async function GET(request: Request, { params }: Segment): Promise<Response> {
  try {
    const { id, n } = await params;
    const file = await getCapturedFile({ input: { id, position: /^\d{1,3}$/.test(n) ? Number(n) : -1 } });
    return new Response(Buffer.from(file.content), {
      headers: {
        "Content-Type": file.contentType,
        "Content-Disposition": contentDisposition("attachment", file.fileName),
        "Content-Security-Policy": "sandbox; default-src 'none'",
        "Cache-Control": NO_STORE,
      },
    });
  } catch (error) {
    return errorResponse(error, request.headers.get("x-request-id") ?? newId());
  }
}
