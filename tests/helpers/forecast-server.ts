import { createServer, type IncomingMessage, type ServerResponse } from "node:http";
import type { AddressInfo } from "node:net";

type Answer = (response: ServerResponse, request: IncomingMessage) => void;

/** A forecast service on this machine that answers as it is told, one answer after the other; the last one stays. */
export async function startForecastServer() {
  const asked: URL[] = [];
  let script: Answer[] = [];
  const server = createServer((request, response) => {
    asked.push(new URL(request.url ?? "/", "http://localhost"));
    const answer = script.length > 1 ? script.shift() : script[0];
    answer?.(response, request);
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const { port } = server.address() as AddressInfo;
  return {
    url: `http://127.0.0.1:${port}/v1/forecast?key=k`,
    asked,
    script: (...answers: Answer[]) => {
      asked.length = 0;
      script = answers;
    },
    stop: () =>
      new Promise<void>((resolve) => {
        server.closeAllConnections();
        server.close(() => resolve());
      }),
  };
}

export const json =
  (body: unknown, status = 200): Answer =>
  (response) => {
    response.writeHead(status, { "content-type": "application/json" });
    response.end(typeof body === "string" ? body : JSON.stringify(body));
  };

export const UNITS = {
  wind_speed_10m: "m/s",
  wind_gusts_10m: "m/s",
  wind_direction_10m: "°",
  precipitation: "mm",
  temperature_2m: "°C",
};

type Hourly = Record<keyof typeof UNITS, (number | null)[]> & { time: string[] };

/** Hours of some days, all alike, in the shape of a hosted service's answer. */
export function answerOf(
  fromDay: string,
  days: number,
  hour: Partial<Record<keyof typeof UNITS, number | null>> = {},
): { utc_offset_seconds: number; hourly_units: Record<string, string>; hourly: Hourly } {
  const values = {
    wind_speed_10m: 10,
    wind_gusts_10m: 16,
    wind_direction_10m: 270,
    precipitation: 0.5,
    temperature_2m: 4,
    ...hour,
  };
  const start = Date.parse(`${fromDay}T00:00:00Z`);
  const time = Array.from({ length: days * 24 }, (_, at) =>
    new Date(start + at * 3_600_000).toISOString().slice(0, 16),
  );
  const hourly = { time } as Hourly;
  for (const [name, value] of Object.entries(values)) hourly[name as keyof typeof UNITS] = time.map(() => value);
  return { utc_offset_seconds: 0, hourly_units: UNITS, hourly };
}
