/** Structured log lines. Fields that could hold a secret are blacked out before they are written. */
import "server-only";
import pino, { type Logger } from "pino";
import { env } from "./env";

const secretFields = ["password", "passwordHash", "cookie", "authorization", "secret", "token", "SESSION_SECRET", "DATABASE_URL"];

let cached: Logger | undefined;

/** The process' log. */
export function log(): Logger {
  cached ??= pino({
    level: env().LOG_LEVEL,
    base: { service: "grainwright" },
    redact: { paths: secretFields.flatMap((field) => [field, `*.${field}`, `*.*.${field}`]), censor: "[kept out of the log]" },
  });
  return cached;
}
