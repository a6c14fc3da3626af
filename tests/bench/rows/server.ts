/** Whether long work gets in the way of people: a plain page's answer beside it and without it, in turn. */
import { setTimeout as sleep } from "node:timers/promises";
import { makeShop, testPassword } from "../../support/shop";
import { type LongWork, straightening } from "../long-work";
import { benchPhotos } from "../photos";
import type { Effort, Outcome, Row } from "../row";
import { median, quantile, spreadOf } from "../spread";
import { signedIn, type WebClient } from "../web-client";

export const serverRow: Row = {
  name: "server",
  what: "a plain page's answer while three photographs are being straightened (95th percentile)",
  against: "the same page while the server has nothing else to do",
  aim: { kind: "at most", ratio: 2 },
  measure,
};

const page = "/today";
/** A person clicks, another one a little later. */
const pauseMs = 20;
/** Until the work has been claimed and is in full swing. */
const settleMs = 1_500;

/** Needs a server that `scripts/commands/bench.mjs` has started, and its environment. */
async function measure({ quick }: Effort): Promise<Outcome> {
  const base = process.env.APP_URL;
  if (base === undefined) throw new Error("no server was started for this row");
  const { maker } = await makeShop("Shop of the bench");
  const client = await signedIn(base, { email: maker.email, password: testPassword });
  const works = await longWork(client, quick);
  const [rounds, requests] = quick ? [2, 10] : [7, 100];
  await timePages(client, requests);
  const [idle, loaded]: [number[], number[]] = [[], []];
  for (let round = 0; round < rounds; round++) {
    idle.push(await timePages(client, requests));
    loaded.push(await besides(works, () => timePages(client, requests)));
  }
  const ratios = loaded.map((ms, round) => ms / (idle[round] as number));
  const found = {
    name: `${page}, ${requests} requests a turn`,
    ratio: spreadOf(ratios),
    processorRatio: null,
    repetitions: rounds,
  };
  return { kind: "measured", cases: [{ ...found, oursMs: median(loaded), theirsMs: median(idle) }] };
}

async function longWork(client: WebClient, quick: boolean): Promise<readonly LongWork[]> {
  const frame = quick ? { widthPx: 600, heightPx: 450 } : { widthPx: 4000, heightPx: 3000 };
  const [photo] = await benchPhotos([{ name: "a panel of 900 × 600 mm, seen whole", lengthMm: 900, widthMm: 600, ...frame }]);
  if (photo === undefined) throw new Error("no photograph");
  return [await straightening(client, photo), await straightening(client, photo), await straightening(client, photo)];
}

/** The 95th percentile of so many answers, ms. */
async function timePages(client: WebClient, requests: number): Promise<number> {
  const times: number[] = [];
  for (let i = 0; i < requests; i++) {
    times.push(await client.timePage(page));
    await sleep(pauseMs);
  }
  return quantile(times, 0.95);
}

async function besides(works: readonly LongWork[], measured: () => Promise<number>): Promise<number> {
  const stop = new AbortController();
  const working = Promise.all(works.map((work) => work(stop.signal)));
  // A failure of the work is told below; until then it must not end the process.
  working.catch(() => {});
  await sleep(settleMs);
  const found = await measured();
  stop.abort();
  await working;
  return found;
}
