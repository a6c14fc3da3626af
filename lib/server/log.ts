/** Structured log lines. Fields that could hold a secret are blacked out before they are written. */
import "server-only";
import pino, { type DestinationStream, type Logger, type LoggerOptions } from "pino";
import { env } from "./env";
import { logError } from "./log-error";

const secretFields = ["password", "passwordHash", "cookie", "authorization", "secret", "token", "SESSION_SECRET", "DATABASE_URL"];

let cached: Logger | undefined;

/** The process' log. */
export function log(): Logger {
  cached ??= makeLog(env().LOG_LEVEL);
  return cached;
}

/** A log of its own, for the process or, with somewhere to write, for a test. */
export function makeLog(level: string, destination?: DestinationStream): Logger {
  const options: LoggerOptions = {
    level,
    base: { service: "grainwright" },
    serializers: { err: logError },
    redact: { paths: secretFields.flatMap((field) => [field, `*.${field}`, `*.*.${field}`]), censor: "[kept out of the log]" },
  };
  return destination ? pino(options, destination) : pino(options);
}
