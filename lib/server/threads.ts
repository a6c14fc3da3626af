/** What all threads of a web server have in common. */
import "server-only";

/**
 * How far they stand back behind the thread that answers requests, in steps of nice(2): where both want the processor, theirs gets a third
 * of what it gets. Somebody waits for most of what they do, so it is not more.
 */
export const STAND_BACK = 5;
