import { NextResponse, type NextRequest } from "next/server";
import { newId } from "@/lib/domain/ids";
import { env } from "@/lib/env";

/** Headers for pages and routes. Never the lock: each service checks for itself who may do what. */

function makeNonce(): string {
  return btoa(String.fromCharCode(...crypto.getRandomValues(new Uint8Array(16))));
}

function contentSecurityPolicy(nonce: string): string {
  // The development server's own tools need both exceptions.
  const evaluation = env.isProduction ? "" : " 'unsafe-eval'";
  return [
    "default-src 'self'",
    `script-src 'nonce-${nonce}' 'strict-dynamic'${evaluation}`,
    env.isProduction ? `style-src 'self' 'nonce-${nonce}'` : "style-src 'self' 'unsafe-inline'",
    // Positions of dragged pieces and bars of charts are style attributes.
    "style-src-attr 'unsafe-inline'",
    "img-src 'self' data: blob:",
    "font-src 'self'",
    "connect-src 'self'",
    "worker-src 'self' blob:",
    "manifest-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join("; ");
}

/** Data, not pages: nothing in it may run or be framed. */
const API_POLICY = "default-src 'none'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'";

/** A browser's own viewer of PDFs needs room for its parts; the type of the answer keeps it from being a page. */
const PAPER_POLICY = "base-uri 'none'; form-action 'none'; frame-ancestors 'none'";

function choosePolicy(pathname: string, nonce: string): string {
  if (!pathname.startsWith("/api/")) return contentSecurityPolicy(nonce);
  return /\/(papers|contact-sheet|practice-sheet)$/.test(pathname) ? PAPER_POLICY : API_POLICY;
}

/** A form of another site, whatever the browser or a proxy header says about it. */
function isForeignChange(request: NextRequest): boolean {
  if (request.method === "GET" || request.method === "HEAD" || request.method === "OPTIONS") return false;
  const origin = request.headers.get("origin");
  return origin !== null && origin !== env.appUrl;
}

/** An address whose percent signs spell no text names nothing; the router itself would fail over it. */
function isReadable(pathname: string): boolean {
  try {
    decodeURIComponent(pathname);
    return true;
  } catch {
    return false;
  }
}

function refuse(status: 403 | 404, sentence: string): NextResponse {
  return new NextResponse(sentence, { status, headers: { "Content-Type": "text/plain; charset=utf-8" } });
}

function answer(request: NextRequest, headers: Headers): NextResponse {
  if (!isReadable(request.nextUrl.pathname)) return refuse(404, "There is nothing at this address.");
  if (isForeignChange(request)) {
    return refuse(403, `This request came from another address. Open ${env.appUrl} and try again.`);
  }
  return NextResponse.next({ request: { headers } });
}

export function proxy(request: NextRequest): NextResponse {
  const requestId = newId();
  const nonce = makeNonce();
  const policy = choosePolicy(request.nextUrl.pathname, nonce);
  const headers = new Headers(request.headers);
  headers.set("x-request-id", requestId);
  headers.set("x-leestead-path", `${request.nextUrl.pathname}${request.nextUrl.search}`);
  headers.set("x-nonce", nonce);
  headers.set("Content-Security-Policy", policy);
  // Nothing in front of this server is trusted to rename it.
  headers.delete("x-forwarded-host");

  const response = answer(request, headers);
  response.headers.set("Content-Security-Policy", policy);
  response.headers.set("x-request-id", requestId);
  response.headers.set("Cache-Control", "private, no-store");
  if (env.appUrl.startsWith("https://")) {
    response.headers.set("Strict-Transport-Security", "max-age=31536000; includeSubDomains");
  }
  return response;
}

export const config = {
  // Route files: what passes here is cut at 10 MB. Their handler looks at the origin, and next.config.ts has the policy.
  matcher: ["/((?!_next/static|_next/image|healthz|readyz|api/gpx/).*)"],
};
