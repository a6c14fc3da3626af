/**
 * Two ways of doing one thing, timed in turn: what slows the machine down for a while slows both, and the ratio of neighbours says more than
 * any time.
 */
import type { Case } from "./row";
import { median, spreadOf } from "./spread";

export interface Pair {
  readonly ours: () => unknown;
  readonly theirs: () => unknown;
}

export interface Turns {
  /** Not counted: code is compiled, memory is taken. */
  readonly warmUps: number;
  readonly repetitions: number;
  /** How many times as long as ours the other may take counts, where we mean to be faster. */
  readonly of?: "ours to theirs" | "theirs to ours";
}

interface Taken {
  readonly wallMs: number;
  readonly processorMs: number;
}

export async function sideBySide(name: string, { ours, theirs }: Pair, { warmUps, repetitions, of }: Turns): Promise<Case> {
  const times: { readonly ours: Taken; readonly theirs: Taken }[] = [];
  for (let turn = -warmUps; turn < repetitions; turn++) {
    const oursFirst = turn % 2 === 0;
    const first = await timed(oursFirst ? ours : theirs);
    const second = await timed(oursFirst ? theirs : ours);
    if (turn >= 0) times.push(oursFirst ? { ours: first, theirs: second } : { ours: second, theirs: first });
  }
  const ratio = (taken: (side: Taken) => number) =>
    times.map((pair) =>
      of === "theirs to ours" ? taken(pair.theirs) / taken(pair.ours) : taken(pair.ours) / taken(pair.theirs),
    );
  return {
    name,
    ratio: spreadOf(ratio(({ wallMs }) => wallMs)),
    processorRatio: median(ratio(({ processorMs }) => processorMs)),
    oursMs: median(times.map((pair) => pair.ours.wallMs)),
    theirsMs: median(times.map((pair) => pair.theirs.wallMs)),
    repetitions,
  };
}

async function timed(work: () => unknown): Promise<Taken> {
  const before = process.cpuUsage();
  const start = performance.now();
  await work();
  const wallMs = performance.now() - start;
  const { user, system } = process.cpuUsage(before);
  // Processor time comes in steps; a very short piece of work may seem to take none.
  return { wallMs, processorMs: Math.max(0.001, (user + system) / 1000) };
}
