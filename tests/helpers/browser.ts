import "./database";
import { getAuth } from "@/lib/auth/auth";
import { handleAuth } from "@/lib/http/handle-auth";

export const ORIGIN = "http://leestead.test";

/** Calls /api/auth as a browser would: with its cookies and its Origin. */
export class Browser {
  readonly jar = new Map<string, string>();
  lastSetCookies: readonly string[] = [];

  constructor(private readonly extraHeaders: Readonly<Record<string, string>> = {}) {}

  get cookie(): string {
    return [...this.jar].map(([name, value]) => `${name}=${value}`).join("; ");
  }

  headers(more: Readonly<Record<string, string>> = {}): Headers {
    const headers = new Headers({ origin: ORIGIN, ...this.extraHeaders, ...more });
    if (this.jar.size > 0) headers.set("cookie", this.cookie);
    return headers;
  }

  async call(path: string, body?: unknown, headers: Readonly<Record<string, string>> = {}): Promise<Response> {
    const response = await handleAuth(
      new Request(`${ORIGIN}/api/auth${path}`, {
        method: body === undefined ? "GET" : "POST",
        headers: this.headers({ ...(body === undefined ? {} : { "content-type": "application/json" }), ...headers }),
        ...(body === undefined ? {} : { body: typeof body === "string" ? body : JSON.stringify(body) }),
      }),
      getAuth().handler,
    );
    this.lastSetCookies = response.headers.getSetCookie();
    for (const cookie of this.lastSetCookies) {
      const [pair = ""] = cookie.split(";");
      const [name = "", ...value] = pair.split("=");
      if (/max-age=0/i.test(cookie)) this.jar.delete(name);
      else this.jar.set(name, value.join("="));
    }
    return response;
  }
}
