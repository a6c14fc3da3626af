import { expect, test } from "vitest";
import { countOfCheck, countOfPlaywright, countOfVitest, countReport, sum, summaryLine } from "../../scripts/ground/summary.mjs";

const file = (status: string, tests: number) => ({ status, assertionResults: Array.from({ length: tests }, () => ({})) });

const vitest = (passed: number, failed: number, files: ReturnType<typeof file>[]) => ({
  numPassedTests: passed,
  numFailedTests: failed,
  numPendingTests: 2,
  numTodoTests: 1,
  testResults: files,
});

test("passed, failed and left-out tests are counted", () => {
  expect(countOfVitest(vitest(5, 1, [file("failed", 9)]), 1)).toEqual({ passed: 5, failed: 1, skipped: 3 });
});

test("a file that does not load is a failure though it holds no failed test", () => {
  expect(countOfVitest(vitest(5, 0, [file("passed", 5), file("failed", 0)]), 1).failed).toBe(1);
});

test("a run that fails for no test it names is a failure", () => {
  expect(countOfVitest(vitest(5, 0, [file("passed", 5)]), 1).failed).toBe(1);
  expect(countOfPlaywright({ stats: { expected: 3, unexpected: 0, flaky: 0, skipped: 0 }, errors: [] }, 130).failed).toBe(1);
});

test("a browser test that passes only at the second try has failed", () => {
  const stats = { expected: 3, unexpected: 1, flaky: 1, skipped: 2 };
  expect(countOfPlaywright({ stats, errors: [{}] }, 1)).toEqual({ passed: 3, failed: 3, skipped: 2 });
});

test("a part that left no report has failed", () => {
  expect(countReport("/nowhere/report.json", 0, countOfVitest)).toEqual(countOfCheck(false));
});

test("the last line names skipped tests only when there are any", () => {
  const total = sum([countOfCheck(true), countOfCheck(false), countOfVitest(vitest(5, 0, []), 0)]);
  expect(summaryLine(total)).toBe("6 passed, 1 failed, 3 skipped");
  expect(summaryLine(sum([countOfCheck(true)]))).toBe("1 passed, 0 failed");
});
