// The voice of the commands: one plain line at a time. Nothing else in scripts/ writes to the terminal.

/** Something the person at the keyboard can mend. `problem` says what is wrong, `mend` says what to do about it. */
export class Refusal extends Error {
  /**
   * @param {string} problem
   * @param {string} mend
   */
  constructor(problem, mend) {
    super(problem);
    this.name = "Refusal";
    this.mend = mend;
  }
}

// A closed terminal turns every later write into an error event; the clean-up still has to run to its end.
process.stdout.on("error", () => {});
process.stderr.on("error", () => {});

/** @param {string} line */
export function say(line) {
  process.stdout.write(`${line}\n`);
}

/**
 * The text for a failure: a refusal in two sentences, anything unforeseen with its stack, so that it can be reported.
 * @param {unknown} failure
 * @returns {string}
 */
export function wordsFor(failure) {
  if (failure instanceof Refusal) return `${failure.message}\n${failure.mend}`;
  return failure instanceof Error ? (failure.stack ?? failure.message) : String(failure);
}

/** @param {unknown} failure */
export function complain(failure) {
  process.stderr.write(`\n${wordsFor(failure)}\n`);
}
