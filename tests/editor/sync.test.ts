import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { changeSpacing } from "@/lib/editor/commands/change-cuts";
import { letPiecesLoose } from "@/lib/editor/commands/loose";
import type { CommandOutcome } from "@/lib/editor/commands/outcome";
import { slideGroups } from "@/lib/editor/commands/slide";
import { applyDiff } from "@/lib/editor/diff";
import type { TableDocument } from "@/lib/editor/document";
import { mergeDocuments } from "@/lib/editor/merge";
import type { SyncStatus } from "@/lib/editor/sync/status";
import { createSync, retryDelay, type SaveOutcome, type SaveRequest } from "@/lib/editor/sync/sync";
import { groupById, SET_ID } from "@/lib/layout";
import { right, rowDocument } from "./sample-table";

function changedBy(document: TableDocument, command: (document: TableDocument) => CommandOutcome): TableDocument {
  const outcome = command(document);
  if (!outcome.ok) throw new Error(`refused: ${outcome.refusal.reason}`);
  return applyDiff(document, outcome.diff);
}
const slid = (document: TableDocument, mm: number, group = SET_ID) =>
  changedBy(document, (d) => slideGroups(d, [group], right(mm)));
const tick = async () => {
  for (let turn = 0; turn < 5; turn++) await Promise.resolve();
};

/** A server and a clock that do only what the test says. */
function world(start = rowDocument()) {
  const requests: { request: SaveRequest; answer: (outcome: SaveOutcome) => void }[] = [];
  const statuses: SyncStatus["kind"][] = [];
  const merged: TableDocument[] = [];
  let timers: { ms: number; then: () => void }[] = [];
  const sync = createSync(
    {
      save: (request) => new Promise((answer) => requests.push({ request, answer })),
      after(ms, then) {
        const timer = { ms, then };
        timers.push(timer);
        return () => {
          timers = timers.filter((other) => other !== timer);
        };
      },
      onStatus: (status) => statuses.push(status.kind),
      onMerged: (document) => merged.push(document),
    },
    start,
    7,
  );
  return {
    sync,
    requests,
    statuses,
    merged,
    delays: () => timers.map(({ ms }) => ms),
    runTimers() {
      const due = timers;
      timers = [];
      for (const { then } of due) then();
    },
    async answer(outcome: SaveOutcome) {
      requests.at(-1)?.answer(outcome);
      await tick();
    },
  };
}

describe("autosave", () => {
  it("saves a moment after a change, from the revision it knows, and says so", async () => {
    const w = world();
    w.sync.changed(slid(rowDocument(), 5));
    expect(w.requests).toHaveLength(0);
    w.runTimers();
    expect(w.requests[0]?.request).toEqual({ baseRevision: 7, document: slid(rowDocument(), 5) });
    await w.answer({ kind: "saved", revision: 8 });
    expect(w.statuses).toEqual(["saving", "saving", "saved"]);
    expect(w.sync.revision()).toBe(8);
  });

  it("has one request in flight and sends what came meanwhile together, from the new revision", async () => {
    const w = world();
    w.sync.changed(slid(rowDocument(), 1));
    w.runTimers();
    w.sync.changed(slid(rowDocument(), 2));
    w.sync.changed(slid(rowDocument(), 3));
    w.runTimers();
    expect(w.requests).toHaveLength(1);
    await w.answer({ kind: "saved", revision: 8 });
    expect(w.requests).toHaveLength(2);
    expect(w.requests[1]?.request).toEqual({ baseRevision: 8, document: slid(rowDocument(), 3) });
    await w.answer({ kind: "saved", revision: 9 });
    expect(w.statuses.at(-1)).toBe("saved");
  });

  it("sends nothing when an undo brings back what is saved", () => {
    const w = world();
    w.sync.changed(slid(rowDocument(), 1));
    w.sync.changed(rowDocument());
    w.runTimers();
    expect(w.requests).toHaveLength(0);
    expect(w.statuses.at(-1)).toBe("saved");
  });

  it("tries again, less and less often, while the server cannot be reached, and at once when the connection is back", async () => {
    const w = world();
    w.sync.changed(slid(rowDocument(), 1));
    w.runTimers();
    await w.answer({ kind: "unreachable" });
    expect(w.statuses.at(-1)).toBe("offline");
    expect(w.delays()).toEqual([retryDelay(1)]);
    w.runTimers();
    await w.answer({ kind: "unreachable" });
    expect(w.delays()).toEqual([retryDelay(2)]);
    w.sync.changed(slid(rowDocument(), 2));
    w.sync.retryNow();
    expect(w.requests).toHaveLength(3);
    expect(w.requests[2]?.request.document).toEqual(slid(rowDocument(), 2));
    await w.answer({ kind: "saved", revision: 8 });
    expect(w.statuses.at(-1)).toBe("saved");
    expect([1, 2, 3, 9].map(retryDelay)).toEqual([2_000, 4_000, 8_000, 30_000]);
  });

  it("a change after a refusal is sent again", async () => {
    const w = world();
    w.sync.changed(slid(rowDocument(), 1));
    w.runTimers();
    await w.answer({ kind: "refused", message: "A piece lies on a board that is not on the table." });
    expect(w.statuses.at(-1)).toBe("refused");
    w.sync.changed(slid(rowDocument(), 2));
    w.runTimers();
    expect(w.requests).toHaveLength(2);
  });

  it("settles: saves at once and tells when it is done, or that it cannot be", async () => {
    const w = world();
    await expect(w.sync.settled()).resolves.toBe(true);
    w.sync.changed(slid(rowDocument(), 1));
    const settled = w.sync.settled();
    await tick();
    expect(w.requests).toHaveLength(1);
    await w.answer({ kind: "saved", revision: 8 });
    await expect(settled).resolves.toBe(true);
    w.sync.changed(slid(rowDocument(), 2));
    const failing = w.sync.settled();
    await tick();
    await w.answer({ kind: "unreachable" });
    await expect(failing).resolves.toBe(false);
  });
});

describe("a second window", () => {
  const base = changedBy(rowDocument(), (d) => letPiecesLoose(d, ["p4"]));
  const loose = base.layout.groups[1]?.id ?? "";
  const mine = slid(base, 5, loose);

  it("changes to other pieces come together without a question, and are saved on top of theirs", async () => {
    const w = world(base);
    const theirs = slid(base, -20);
    w.sync.changed(mine);
    w.runTimers();
    await w.answer({ kind: "conflict", theirs: { revision: 12, updatedBy: "Ida", document: theirs } });
    const both = slid(theirs, 5, loose);
    expect(w.merged).toEqual([both]);
    expect(w.requests.at(-1)?.request).toEqual({ baseRevision: 12, document: both });
    await w.answer({ kind: "saved", revision: 13 });
    expect(w.statuses.at(-1)).toBe("saved");
  });

  it("changes to the same pieces are asked about; nothing is sent until somebody chooses", async () => {
    const theirs = { revision: 12, updatedBy: "Ida", document: slid(base, 40, loose) };
    for (const keep of ["mine", "theirs"] as const) {
      const w = world(base);
      w.sync.changed(mine);
      w.runTimers();
      await w.answer({ kind: "conflict", theirs });
      expect(w.statuses.at(-1)).toBe("conflict");
      w.sync.changed(mine);
      w.sync.retryNow();
      w.runTimers();
      expect(w.requests).toHaveLength(1);
      w.sync.resolve(keep);
      expect(w.requests.at(-1)?.request.baseRevision).toBe(keep === "mine" ? 12 : 7);
      expect(w.merged).toEqual(keep === "mine" ? [] : [theirs.document]);
      expect(w.sync.revision()).toBe(12);
    }
  });

  it("is not seen in our own save whose answer was lost, nor in what was changed after it", async () => {
    const w = world();
    const first = slid(rowDocument(), 1);
    const second = slid(rowDocument(), 2);
    w.sync.changed(first);
    w.runTimers();
    await w.answer({ kind: "unreachable" });
    w.sync.changed(second);
    w.sync.retryNow();
    await w.answer({ kind: "conflict", theirs: { revision: 8, updatedBy: "me", document: first } });
    expect(w.statuses).not.toContain("conflict");
    expect(w.merged).toEqual([]);
    expect(w.requests.at(-1)?.request).toEqual({ baseRevision: 8, document: second });
    await w.answer({ kind: "saved", revision: 9 });
    expect(w.statuses.at(-1)).toBe("saved");
  });

  it("that made the very same change leaves nothing to ask", () => {
    expect(mergeDocuments(base, mine, slid(base, 5, loose))).toEqual({ ok: true, document: mine });
  });

  it("merging keeps both sides' changes, from whichever side it is seen", () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 300 }), fc.integer({ min: 1, max: 300 }), (a, b) => {
        const [left, rightHand] = [slid(base, a), slid(base, b, loose)];
        const one = mergeDocuments(base, left, rightHand);
        const other = mergeDocuments(base, rightHand, left);
        expect(one).toEqual(other);
        expect(one.ok && groupById(one.document.layout, loose)).toEqual(groupById(rightHand.layout, loose));
        expect(one.ok && groupById(one.document.layout, SET_ID)).toEqual(groupById(left.layout, SET_ID));
      }),
    );
  });

  it("a setting here and a slide there go together; the same setting twice does not", () => {
    const tight = changedBy(base, (d) => changeSpacing(d, "tight"));
    expect(mergeDocuments(base, tight, mine).ok).toBe(true);
    const merge = mergeDocuments(base, mine, slid(base, 1, loose));
    expect(merge).toEqual({ ok: false, both: ["p4"] });
  });
});
