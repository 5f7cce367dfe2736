import pino, { type Logger } from "pino";
import { settings } from "@/lib/env";

let logger: Logger | undefined;

/** The process's log: one JSON line an event, to standard output. Holds ids, never passwords or readings' texts. */
export function log(): Logger {
  logger ??= pino({ level: settings().LOG_LEVEL, base: null, redact: ["password", "token", "cookie"] });
  return logger;
}
