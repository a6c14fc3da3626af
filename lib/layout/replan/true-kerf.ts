/** How wide the blades really are, at each cut done and from now on. */
import type { CutMachines, Machine } from "../program/machine";
import { bladeOf, type CutKind, type CutStep, isSawn } from "../program/program";
import { type Um, um } from "../units/um";
import type { AsCutEntry } from "./as-cut";
import { openSteps, type RestRequest } from "./part-in-hand";

type KerfEntry = Extract<AsCutEntry, { kind: "kerf" }>;

export interface KerfsAsCut {
  /** Width of the blade at one step. */
  readonly at: (step: CutStep) => Um;
  /** What has to be planed off an edge that the step leaves: of a saw that the layout was not made for. */
  readonly owedAfter: (step: CutStep) => Um;
  /** For cuts still to be planned. What was entered last holds on: by the place of its cut in the program, then in the list. */
  readonly kerf: Readonly<Record<CutKind, Um>>;
  /** The shop's saws with the blades they turned out to have. */
  readonly machines: CutMachines | undefined;
}

export function kerfsAsCut(request: RestRequest): KerfsAsCut {
  const { program, entries, saws, asked } = request;
  const steps = openSteps(request);
  const place = new Map(steps.map(({ number }, i) => [number, i]));
  const sawOf = ({ kind, machineId }: CutStep): string | null => (isSawn(kind) ? (machineId ?? saws[kind]) : null);
  const kerfs = entries.flatMap((entry, order) => {
    const step = entry.kind === "kerf" ? steps.find(({ number }) => number === entry.step) : undefined;
    return entry.kind === "kerf" && step ? [{ ...entry, saw: sawOf(step), order }] : [];
  });
  /** From which place on an entry holds. */
  const since = ({ step, reach }: KerfEntry): number => (reach === "all" ? -1 : (place.get(step) ?? 0));
  const holding = (saw: string | null, planned: Um, until = Number.POSITIVE_INFINITY): Um => {
    const lasting = kerfs.filter((entry) => entry.saw === saw && entry.reach !== "only" && since(entry) <= until);
    const [newest] = lasting.sort((a, b) => since(b) - since(a) || b.order - a.order);
    return newest?.kerf ?? planned;
  };
  const asItIs = (machine: Machine): Machine => ({ ...machine, kerf: holding(machine.id, machine.kerf) });
  const { machines } = asked;
  return {
    at: (step) => {
      if (!isSawn(step.kind)) return um(0);
      const own = kerfs.find((entry) => entry.reach === "only" && entry.step === step.number);
      return own?.kerf ?? holding(sawOf(step), bladeOf(step, program), place.get(step.number) ?? 0);
    },
    owedAfter: ({ kind, machineId }) => {
      if (!machines || !isSawn(kind) || machineId === undefined || machineId === machines[kind].id) return um(0);
      const saw = [machines.rip, machines.crosscut, ...machines.others].find(({ id }) => id === machineId);
      return saw?.cleanUp ?? um(0);
    },
    kerf: { rip: holding(saws.rip, program.kerf.rip), crosscut: holding(saws.crosscut, program.kerf.crosscut) },
    machines: machines && {
      rip: asItIs(machines.rip),
      crosscut: asItIs(machines.crosscut),
      others: machines.others.map(asItIs),
    },
  };
}
