import "server-only";
import { HOURLY, readAnswer } from "./read-answer";
import { ForecastTrouble, type ForecastRequest, type ForecastSource } from "./source";

interface HttpSettings {
  /** From the environment, never from a request; may carry a key of its own in the query. */
  readonly url: string;
  readonly name: string;
  /** For one try, answer and body together. */
  readonly timeoutMs?: number;
  readonly maxBytes?: number;
  /** Tries in all. */
  readonly tries?: number;
  readonly pauseMs?: number;
}

const pause = (ms: number) => new Promise((resolve) => setTimeout(resolve, ms));

/** Two decimals, about a kilometre: no more of where the group sleeps goes out than a forecast needs. */
const rounded = (degrees: number) => (Math.round(degrees * 100) / 100).toFixed(2);

function addressOf(base: string, request: ForecastRequest): URL {
  const url = new URL(base);
  url.searchParams.set("latitude", rounded(request.latitude));
  url.searchParams.set("longitude", rounded(request.longitude));
  if (request.altitudeM !== null) url.searchParams.set("elevation", request.altitudeM.toFixed(0));
  url.searchParams.set("hourly", Object.keys(HOURLY).join(","));
  url.searchParams.set("wind_speed_unit", "ms");
  url.searchParams.set("timezone", "GMT");
  url.searchParams.set("start_date", request.fromDay);
  url.searchParams.set("end_date", request.toDay);
  return url;
}

async function readBody(response: Response, maxBytes: number): Promise<string> {
  const chunks: Uint8Array[] = [];
  let size = 0;
  const reader = response.body?.getReader();
  while (reader) {
    const { done, value } = await reader.read();
    if (done) break;
    size += value.byteLength;
    if (size > maxBytes) {
      await reader.cancel();
      throw new ForecastTrouble("too-large", `more than ${maxBytes} bytes`);
    }
    chunks.push(value);
  }
  return new TextDecoder().decode(Buffer.concat(chunks));
}

/** No redirect is followed, so nothing that the service says leads to another host. */
function requireAnswer({ status }: Response): void {
  if (status === 200) return;
  if (status >= 300 && status < 400) throw new ForecastTrouble("refused", `redirect with ${status}, not followed`);
  if (status === 400 || status === 404) throw new ForecastTrouble("not-covered", `status ${status}`);
  throw new ForecastTrouble(status >= 500 ? "down" : "refused", `status ${status}`);
}

async function tryOnce(url: URL, timeoutMs: number, maxBytes: number): Promise<string> {
  const signal = AbortSignal.timeout(timeoutMs);
  try {
    const headers = { accept: "application/json" };
    const response = await fetch(url, { redirect: "manual", signal, headers, cache: "no-store" });
    requireAnswer(response);
    return await readBody(response, maxBytes);
  } catch (error) {
    if (error instanceof ForecastTrouble) throw error;
    if (signal.aborted) throw new ForecastTrouble("slow", `no whole answer in ${timeoutMs} ms`);
    throw new ForecastTrouble("down", error instanceof Error ? error.message : "no connection");
  }
}

const isWorthAnotherTry = (error: unknown) =>
  error instanceof ForecastTrouble && (error.kind === "slow" || error.kind === "down");

/** A hosted service that answers hourly values as JSON (`readAnswer` says in which shape) for a position and days. */
export function httpSource(settings: HttpSettings): ForecastSource {
  const { url, name, timeoutMs = 6000, maxBytes = 512_000, tries = 2, pauseMs = 400 } = settings;
  return {
    name,
    isSample: false,
    async fetchHours(request) {
      const address = addressOf(url, request);
      for (let tried = 1; ; tried += 1) {
        try {
          return readAnswer(await tryOnce(address, timeoutMs, maxBytes));
        } catch (error) {
          if (tried >= tries || !isWorthAnotherTry(error)) throw error;
          await pause(pauseMs);
        }
      }
    },
  };
}
