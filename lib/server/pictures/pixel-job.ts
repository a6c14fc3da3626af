/** What the pool and its threads say to each other. Plain values that survive being copied between threads. */
import "server-only";
import type { MessagePort } from "node:worker_threads";
import type { Marking } from "@/lib/layout";
import type { CancelFlag } from "./cancel-flag";
import type { ComposedPicture, ComposeRequest } from "./compose";
import type { InspectOutcome } from "./inspect-upload";
import type { StraightenOutcome } from "./straighten";
import type { UprightOutcome } from "./upright";

/** Request and answer of every job, by name. */
export interface PixelJobs {
  readonly inspect: { readonly request: { readonly bytes: Uint8Array }; readonly answer: InspectOutcome };
  readonly upright: { readonly request: { readonly bytes: Uint8Array }; readonly answer: UprightOutcome };
  readonly straighten: {
    readonly request: { readonly bytes: Uint8Array; readonly marking: Marking };
    readonly answer: StraightenOutcome;
  };
  readonly compose: { readonly request: ComposeRequest; readonly answer: ComposedPicture };
}

export type PixelJobName = keyof PixelJobs;

export interface PixelTask<Name extends PixelJobName> {
  readonly request: PixelJobs[Name]["request"];
  readonly cancel: CancelFlag;
  /** Gets numbers from 0 to 1. */
  readonly progress: MessagePort;
}
