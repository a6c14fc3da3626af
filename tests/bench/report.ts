/** What a run of the bench found, as a table to read and as JSON to keep. */
import type { Machine } from "./machine";
import { type Case, meets, type Outcome, type Row } from "./row";

export interface Finding {
  readonly row: Row;
  readonly outcome: Outcome;
}

export interface Report {
  readonly at: Date;
  readonly quick: boolean;
  readonly machine: Machine;
  readonly versions: Readonly<Record<string, string>>;
  readonly findings: readonly Finding[];
}

export function reportJson({ at, quick, machine, versions, findings }: Report): string {
  const rows = findings.map(({ row, outcome }) => ({
    name: row.name,
    what: row.what,
    against: row.against,
    aim: row.aim,
    ...(outcome.kind === "measured"
      ? { kind: outcome.kind, cases: outcome.cases.map((one) => ({ ...one, meets: quick ? null : meets(row, one) })) }
      : outcome),
  }));
  return `${JSON.stringify({ format: 1, at: at.toISOString(), quick, machine, versions, rows }, null, 2)}\n`;
}

export function reportText({ quick, machine, versions, findings }: Report): string {
  const { cpu, cores, memoryGb, system, load } = machine;
  return [
    ...findings.map((finding) => findingText(finding, quick)),
    `${cpu}, ${cores} cores, ${memoryGb} GB, ${system}; load before: ${load}`,
    Object.entries(versions)
      .map(([name, version]) => `${name} ${version}`)
      .join(", "),
    ...(quick ? ["Quick: small sizes and few repetitions. These ratios say that it runs, no more."] : []),
    ...(load > cores / 2
      ? ["The machine was busy with other work: ratios of times are shaky, those of processor time less so."]
      : []),
  ].join("\n");
}

function findingText({ row, outcome }: Finding, quick: boolean): string {
  const aim = `${row.aim.kind} ${row.aim.ratio}×`;
  const head = `${row.name}: ${row.what}\n  against ${row.against}; aim ${aim}`;
  const lines =
    outcome.kind === "measured" ? outcome.cases.map((one) => caseText(row, one, quick)) : [`  not built yet: ${outcome.why}`];
  return `${[head, ...lines].join("\n")}\n`;
}

function caseText(row: Row, one: Case, quick: boolean): string {
  const { median, low, high } = one.ratio;
  const processor = one.processorRatio === null ? "" : `, processor time ${times(one.processorRatio)}`;
  // Of small sizes there is nothing to judge.
  const verdict = quick ? "   " : meets(row, one) ? "yes" : "NO ";
  const size = `${ms(one.oursMs)} to ${ms(one.theirsMs)}, ${one.repetitions} turns`;
  return `  ${verdict} ${times(median)} (${times(low)} to ${times(high)})${processor}  ${one.name} [${size}]`;
}

const times = (ratio: number): string => `${ratio.toFixed(ratio >= 10 ? 0 : 2)}×`;
const ms = (value: number): string => `${value.toFixed(value >= 10 ? 0 : 2)} ms`;
