/** A refusal of the API as an error whose message can be shown as it is. */
import type { Fault } from "@/lib/schemas/fault";

export class FaultFromServer extends Error {
  readonly fault: Fault;

  constructor(fault: Fault) {
    super(fault.title);
    this.name = "FaultFromServer";
    this.fault = fault;
  }
}

/** The sentence to show for anything that a request may throw. */
export function messageOf(error: unknown): string {
  if (error instanceof FaultFromServer) return error.message;
  if (error instanceof TypeError) return "The server cannot be reached. Check the connection and try again.";
  return error instanceof Error ? error.message : "Something went wrong. Try again.";
}
