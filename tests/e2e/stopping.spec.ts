import { spawn } from "node:child_process";
import { fileURLToPath } from "node:url";
import { expect, test } from "@playwright/test";
import { LEADER, PASSWORD } from "./people";

const PORT = 3218;
const url = `http://localhost:${PORT}`;
const root = fileURLToPath(new URL("../..", import.meta.url));

/** A server of its own, told to stop while it answers. */
test("requests in flight when the server is told to stop are answered", async () => {
  test.setTimeout(240_000);
  const env = { ...process.env, E2E_PORT: String(PORT) };
  const server = spawn(process.execPath, ["tests/e2e/server.mjs"], { cwd: root, env, stdio: "ignore" });
  const ended = new Promise<number | null>((resolve) => server.once("exit", (code) => resolve(code)));
  try {
    await expect
      .poll(
        () =>
          fetch(`${url}/readyz`).then(
            (answer) => answer.status,
            () => 0,
          ),
        { timeout: 90_000 },
      )
      .toBe(200);
    const signIn = await fetch(`${url}/api/auth/sign-in/email`, {
      method: "POST",
      headers: { "content-type": "application/json", origin: url },
      body: JSON.stringify({ email: LEADER, password: PASSWORD }),
    });
    const cookie = signIn.headers
      .getSetCookie()
      .map((one) => one.split(";")[0])
      .join("; ");
    const trips = await (await fetch(`${url}/trips`, { headers: { cookie } })).text();
    const trip = /\/trips\/[0-9a-z]{20,}/.exec(trips)?.[0] ?? "";
    const booklets = Array.from({ length: 6 }, () =>
      fetch(`${url}/api${trip}/papers?paper=booklet&size=A4`, { headers: { cookie } }).then(async (answer) => ({
        status: answer.status,
        start: Buffer.from(await answer.arrayBuffer())
          .subarray(0, 5)
          .toString("latin1"),
      })),
    );
    // One thread renders them, so when the first is there the others are in the house and not yet answered.
    await Promise.race(booklets);
    server.kill("SIGTERM");
    for (const booklet of await Promise.all(booklets)) expect(booklet).toEqual({ status: 200, start: "%PDF-" });
    // 128 + 15: ended by the signal, after the answers.
    expect(await ended).toBe(143);
  } finally {
    server.kill("SIGKILL");
  }
});
