/** Long work survives: claimed once, taken up again after a kill, cancelled cleanly, kept once. */
import { setTimeout as sleep } from "node:timers/promises";
import { and, eq } from "drizzle-orm";
import { beforeAll, beforeEach, describe, expect, it } from "vitest";
import { recordHistory } from "@/db/queries/history";
import { claimTask, findTask, finishTask, insertTask, requestCancel } from "@/db/queries/task";
import { history, task } from "@/db/schema";
import { database } from "@/lib/server/database";
import { kinds } from "@/lib/server/tasks/kinds";
import { inLane, lanes } from "@/lib/server/tasks/lanes";
import { runTask } from "@/lib/server/tasks/run-task";
import type { TaskKind } from "@/lib/server/tasks/task-kind";
import { workLoop } from "@/lib/server/tasks/work-loop";
import { makeShop, type TestShop } from "../support/shop";

let shop: TestShop;
beforeAll(async () => {
  shop = await makeShop("Task shop");
});
// The queue is one for all shops: what other tests left waiting is none of this file's business.
beforeEach(async () => {
  await database().update(task).set({ state: "cancelled" }).where(eq(task.state, "queued"));
});

const queue = () =>
  insertTask(database(), shop.maker.shopId, {
    kind: "straighten",
    payload: {},
    createdBy: shop.maker.userId,
    createdAt: new Date(),
  });
const state = async (id: string) => findTask(database(), shop.maker.shopId, id);
const inHalfAMinute = () => new Date(Date.now() + 30_000);
const never = new AbortController().signal;

/** A kind that does what the test says and keeps one history row, so that keeping twice shows. */
function kindThat(work: TaskKind["work"], abandoned: string[] = []): TaskKind {
  return {
    work,
    abandon: async (_payload, { taskId }, { state: end }) => {
      abandoned.push(`${taskId} ${end}`);
    },
  };
}
const keepRow = (taskId: string) => async (tx: Parameters<Awaited<ReturnType<TaskKind["work"]>>>[0], at: Date) => {
  await recordHistory(tx, shop.maker.shopId, { userId: null, noun: "straightening", nounId: taskId, verb: "kept" }, at);
};
const timesKept = async (taskId: string) =>
  (
    await database()
      .select()
      .from(history)
      .where(and(eq(history.nounId, taskId), eq(history.verb, "kept")))
  ).length;

describe("claiming", () => {
  it("gives every task to exactly one of many workers", async () => {
    const ids = await Promise.all(Array.from({ length: 12 }, queue));
    const claims = await Promise.all(Array.from({ length: 20 }, () => claimTask(database(), new Date(), inHalfAMinute())));
    const claimed = claims.flatMap((row) => (row ? [row.id] : [])).sort();
    expect(claimed).toEqual([...ids].sort());
  });

  it("takes the oldest first", async () => {
    const first = await queue();
    await sleep(2);
    await queue();
    expect((await claimTask(database(), new Date(), inHalfAMinute()))?.id).toBe(first);
  });

  it("leaves a task alone while its lease runs and takes it up again afterwards", async () => {
    const id = await queue();
    const lost = await claimTask(database(), new Date(), new Date(Date.now() + 5_000));
    expect(lost?.id).toBe(id);
    expect(await claimTask(database(), new Date(), inHalfAMinute())).toBeUndefined();
    const again = await claimTask(database(), new Date(Date.now() + 6_000), inHalfAMinute());
    expect(again).toMatchObject({ id, attempts: 2 });
    // The first worker wakes up late: its claim is void.
    const late = { id, claimId: lost?.claimId ?? "" };
    expect(await finishTask(database(), late, { state: "done", at: new Date() })).toBe(false);
    expect((await state(id))?.state).toBe("running");
  });
});

describe("working", () => {
  it("keeps the result in the transaction that ends the task", async () => {
    const id = await queue();
    const row = await claimTask(database(), new Date(), inHalfAMinute());
    if (!row) throw new Error("nothing claimed");
    await runTask(
      database(),
      kindThat(async () => keepRow(id)),
      row,
      never,
    );
    expect(await state(id)).toMatchObject({ state: "done", progress: 1 });
    expect(await timesKept(id)).toBe(1);
  });

  it("keeps nothing when keeping fails half-way, and says why", async () => {
    const id = await queue();
    const row = await claimTask(database(), new Date(), inHalfAMinute());
    if (!row) throw new Error("nothing claimed");
    const abandoned: string[] = [];
    const kind = kindThat(
      async () => async (tx, at) => {
        await keepRow(id)(tx, at);
        throw new Error("the disk is full");
      },
      abandoned,
    );
    await runTask(database(), kind, row, never);
    expect(await state(id)).toMatchObject({ state: "failed", failure: "the disk is full" });
    expect(await timesKept(id)).toBe(0);
    expect(abandoned).toEqual([`${id} failed`]);
  });

  it("hears a cancel while it works, and abandons", async () => {
    const id = await queue();
    const row = await claimTask(database(), new Date(), inHalfAMinute());
    if (!row) throw new Error("nothing claimed");
    const abandoned: string[] = [];
    const kind = kindThat(async (_payload, { signal, onProgress }) => {
      onProgress(0.4);
      await requestCancel(database(), shop.maker.shopId, id, new Date());
      await new Promise((_, reject) => signal.addEventListener("abort", () => reject(new Error("stopped"))));
      return keepRow(id);
    }, abandoned);
    await runTask(database(), kind, row, never);
    expect(await state(id)).toMatchObject({ state: "cancelled", progress: 0.4 });
    expect(abandoned).toEqual([`${id} cancelled`]);
    expect(await timesKept(id)).toBe(0);
  });

  it("is put back when its process is asked to end, and another finishes it once", async () => {
    const id = await queue();
    const ending = new AbortController();
    const stopped = kindThat(async (_payload, { signal }) => {
      setTimeout(() => ending.abort(), 20);
      await new Promise((_, reject) => signal.addEventListener("abort", () => reject(new Error("stopped"))));
      return keepRow(id);
    });
    await workLoop(database(), { ...kinds, straighten: stopped }, ending.signal);
    expect(await state(id)).toMatchObject({ state: "queued", attempts: 0 });

    const done = new AbortController();
    const second = kindThat(async () => {
      setTimeout(() => done.abort(), 100);
      return keepRow(id);
    });
    await workLoop(database(), { ...kinds, straighten: second }, done.signal);
    expect((await state(id))?.state).toBe("done");
    expect(await timesKept(id)).toBe(1);
  });

  it("goes on beside another of the same loop where there are two places, and not where there is one", async () => {
    const most = async (places: number) => {
      const ids = [await queue(), await queue(), await queue()];
      const ending = new AbortController();
      const seen = { under: 0, most: 0, begun: 0 };
      const kind = kindThat(async () => {
        seen.begun += 1;
        seen.most = Math.max(seen.most, ++seen.under);
        await sleep(120);
        seen.under -= 1;
        if (seen.begun === ids.length && seen.under === 0) ending.abort();
        return async () => {};
      });
      await workLoop(database(), { straighten: kind }, ending.signal, places);
      for (const id of ids) expect((await state(id))?.state).toBe("done");
      return seen.most;
    };
    expect(await most(1)).toBe(1);
    expect(await most(2)).toBe(2);
  });

  it("is left alone by a loop for other kinds: a search holds up no picture", async () => {
    const id = await queue();
    const ending = new AbortController();
    setTimeout(() => ending.abort(), 150);
    const { straighten: _, ...others } = kinds;
    await workLoop(database(), others, ending.signal);
    expect((await state(id))?.state).toBe("queued");
    expect(Object.keys(inLane(kinds, "searches"))).not.toContain("straighten");
    expect(lanes.flatMap((lane) => Object.keys(inLane(kinds, lane))).sort()).toEqual(Object.keys(kinds).sort());
  });

  it("is given up after four starts that never came to an end", async () => {
    const id = await queue();
    await database().update(task).set({ attempts: 4 }).where(eq(task.id, id));
    const row = await claimTask(database(), new Date(), inHalfAMinute());
    if (!row) throw new Error("nothing claimed");
    await runTask(
      database(),
      kindThat(async () => keepRow(id)),
      row,
      never,
    );
    expect((await state(id))?.state).toBe("failed");
    expect(await timesKept(id)).toBe(0);
  });
});

describe("a task of another shop", () => {
  it("is not found and not cancelled", async () => {
    const id = await queue();
    const other = await makeShop();
    expect(await findTask(database(), other.maker.shopId, id)).toBeUndefined();
    expect(await requestCancel(database(), other.maker.shopId, id, new Date())).toBe(false);
    expect((await state(id))?.state).toBe("queued");
  });
});

describe("a task that cannot even be abandoned", () => {
  it("ends as failed instead of being started for ever", async () => {
    const id = await queue();
    const row = await claimTask(database(), new Date(), inHalfAMinute());
    if (!row) throw new Error("nothing claimed");
    const broken: TaskKind = {
      work: async () => {
        throw new Error("no such payload");
      },
      abandon: async () => {
        throw new Error("nor can it be abandoned");
      },
    };
    await runTask(database(), broken, row, never);
    expect(await state(id)).toMatchObject({ state: "failed", failure: "no such payload" });
  });
});
