import "../../helpers/database";
import { NextRequest } from "next/server";
import { expect, it } from "vitest";
import { proxy } from "@/proxy";

it.each(["/trips/%E0%A4%A", "/api/trips/%FF/papers", "/gear/%C0%AF"])("%s spells no text: nothing is there", (path) => {
  const response = proxy(new NextRequest(`http://leestead.test${path}`));
  expect(response.status).toBe(404);
  expect(response.headers.get("cache-control")).toBe("private, no-store");
  expect(response.headers.get("content-security-policy")).toContain("frame-ancestors 'none'");
});

it.each(["/trips/%00", "/trips/%C3%A9", "/trips/100%25"])("%s can be read, and goes on", (path) => {
  expect(proxy(new NextRequest(`http://leestead.test${path}`)).headers.get("x-middleware-next")).toBe("1");
});
