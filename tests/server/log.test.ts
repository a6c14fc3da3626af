/** What reaches the log, and what must not. */
import { describe, expect, it } from "vitest";
import { makeLog } from "@/lib/server/log";

function logged(write: (log: ReturnType<typeof makeLog>) => void): string {
  const lines: string[] = [];
  write(makeLog("trace", { write: (line: string) => lines.push(line) }));
  return lines.join("");
}

/** As the query builder and the driver fail: the values stand in message, stack and fields. */
function failedQuery(): Error {
  const message = "Failed query: insert into `user` values (?, ?)\nparams: ilse@shop.example,$argon2id$hidden";
  const cause = Object.assign(new Error("Duplicate entry 'ilse@shop.example' for key 'user_email'"), {
    code: "ER_DUP_ENTRY",
    sql: "insert into user values ('ilse@shop.example')",
  });
  return Object.assign(new Error(message, { cause }), { params: ["ilse@shop.example", "$argon2id$hidden"], query: "insert" });
}

describe("the log", () => {
  it("is one JSON object a line with level, time and the fields given", () => {
    const line = JSON.parse(logged((log) => log.info({ requestId: "r1", status: 200 }, "answered")));
    expect(line).toMatchObject({ level: 30, service: "grainwright", requestId: "r1", status: 200, msg: "answered" });
  });

  it("blacks out fields that hold secrets, also inside others", () => {
    const text = logged((log) =>
      log.info({ password: "hidden", body: { password: "hidden", token: "hidden" }, a: { b: { cookie: "hidden" } } }),
    );
    expect(text).not.toContain("hidden");
    expect(text).toContain("kept out of the log");
  });

  it("tells what failed in the database and where, without the values of the query", () => {
    const text = logged((log) => log.error({ err: failedQuery() }, "failed"));
    expect(text).not.toContain("ilse@shop.example");
    expect(text).not.toContain("hidden");
    expect(text).toContain("Failed query: insert into `user`");
    expect(text).toContain("ER_DUP_ENTRY");
    expect(text).toContain("log.test.ts");
  });
});
