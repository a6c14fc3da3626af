/** Errors as log lines hold them: what went wrong and where, without the values of the query that failed. */
import "server-only";
import { stdSerializers } from "pino";

/** Drivers and the query builder put a query's values, thus e-mail addresses and hashes, into messages, stacks and these fields. */
const fieldsWithValues = ["params", "sql", "query", "parameters", "values"];

/** From "params:" to the end of the message; in a stack, to its first frame. */
const valuesInText = /\nparams:[\s\S]*?(?=\n\s+at |$)/g;
/** MariaDB names the value that a unique key refused. */
const refusedValue = /Duplicate entry '[\s\S]*?' for key/g;

const withoutValues = (text: string): string =>
  text
    .replace(valuesInText, "\nparams: [kept out of the log]")
    .replace(refusedValue, "Duplicate entry [kept out of the log] for key");

/** For pino's `err` field. Anything that is no error is left as it is. */
export function logError(error: unknown): unknown {
  if (!(error instanceof Error)) return error;
  const { message, stack, ...fields } = stdSerializers.err(error);
  const kept = Object.entries(fields).filter(([name]) => !fieldsWithValues.includes(name) && name !== "cause" && name !== "raw");
  return {
    ...Object.fromEntries(kept),
    message: withoutValues(message),
    stack: withoutValues(stack),
    ...(error.cause instanceof Error && { cause: logError(error.cause) }),
  };
}
