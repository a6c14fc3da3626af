/** Makes the demo: the shop, its rack, its jobs, and last its people's way in. */
import type { Database } from "@/db/client";
import { kinds } from "@/lib/server/tasks/kinds";
import { workLoop } from "@/lib/server/tasks/work-loop";
import { foundShop, letPeopleIn } from "./found-shop";
import { openJobs } from "./open-jobs";
import type { TakePhoto } from "./photographers";
import { takeInBoards } from "./take-in-boards";

export interface Making {
  readonly db: Database;
  readonly now: Date;
  readonly takePhoto: TakePhoto;
  /** Share of the photographs' full size along each side: 1, or less for tests. */
  readonly photoScale: number;
  readonly say: (line: string) => void;
}

/**
 * Everything but founding the shop goes through the use cases that the screens call, so history, numbers and checks are real. Broken
 * off anywhere, it leaves a shop that nobody belongs to (see `unfinished`).
 */
export async function makeDemo({ db, now, takePhoto, photoScale, say }: Making): Promise<void> {
  const shop = await db.transaction((tx) => foundShop(tx, now));
  const ending = new AbortController();
  // Pictures are straightened by the same queue as in the product; other machines that work off this database may help.
  const working = workLoop(db, kinds, ending.signal);
  try {
    const boardIds = await takeInBoards({ shop, now, takePhoto, photoScale, say, ending: ending.signal });
    say("Opening jobs, laying out fronts and issuing cut orders");
    await openJobs({ shop, now, boardIds });
  } finally {
    ending.abort();
    await working;
  }
  await db.transaction((tx) => letPeopleIn(tx, shop, now));
}
