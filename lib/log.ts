import pino, { type Logger } from "pino";
import { env } from "./env";

let logger: Logger | undefined;

function getLogger(): Logger {
  logger ??= pino({ level: env.logLevel, base: null, timestamp: pino.stdTimeFunctions.isoTime });
  return logger;
}

type Fields = Readonly<Record<string, string | number | boolean | null | undefined>>;

/** One line of JSON per event. Give it ids and codes; never addresses, names, tokens or texts that people wrote. */
export const log = {
  info: (event: string, fields: Fields = {}) => getLogger().info(fields, event),
  warn: (event: string, fields: Fields = {}) => getLogger().warn(fields, event),
  error: (event: string, error: unknown, fields: Fields = {}) =>
    getLogger().error({ ...fields, err: error instanceof Error ? error : new Error(String(error)) }, event),
};
