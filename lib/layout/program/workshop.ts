/** The saws a program may choose among, in the order in which they are thought of, and what the shop holds safe. */
import type { CutRequest } from "./cut-request";
import { type CutMachines, type Machine, type MachineKind, noLimits } from "./machine";
import { type CutKind, type ShopLimits, THINNEST_SAWN } from "./program";
import type { Axis } from "./region";

export interface Tool {
  readonly machine: Machine;
  /** The layout was spaced for it. */
  readonly preferred: boolean;
  /** µm that have to come off each edge it leaves, apart from what the layout takes off anyway. */
  readonly owes: number;
}

export interface Workshop {
  /** The preferred one first. */
  readonly tools: Readonly<Record<Axis, readonly Tool[]>>;
  readonly limits: ShopLimits;
  readonly thinnestSawn: number;
  /** Blades by which blanks that lie far enough apart come apart for certain: those of the preferred saws. */
  readonly kerf: KerfByAxis;
  /** With less room between them than this no saw of the shop parts two blanks. */
  readonly thinnestKerf: KerfByAxis;
  /** Steps name their machines. */
  readonly named: boolean;
}

export type KerfByAxis = Readonly<Record<Axis, number>>;

export function workshopOf(request: CutRequest): Workshop {
  const { limits, machines, thinnestSawn = THINNEST_SAWN } = request;
  const tools = machines
    ? { x: toolsFor("crosscut", machines), y: toolsFor("rip", machines) }
    : { x: [onlySaw("crosscut", request)], y: [onlySaw("rip", request)] };
  return {
    tools,
    limits,
    thinnestSawn,
    kerf: { x: tools.x[0]?.machine.kerf ?? 0, y: tools.y[0]?.machine.kerf ?? 0 },
    thinnestKerf: { x: thinnest(tools.x), y: thinnest(tools.y) },
    named: machines !== undefined,
  };
}

/** Of other saws those that stay on their feet come first. */
const orderOfKinds: readonly MachineKind[] = ["table", "track", "band", "hand"];

function toolsFor(kind: CutKind, machines: CutMachines): readonly Tool[] {
  const preferred = machines[kind];
  const others = [machines.rip, machines.crosscut, ...machines.others].filter(
    ({ id, limits }, i, all) =>
      id !== preferred.id && all.findIndex((one) => one.id === id) === i && (kind === "rip" ? limits.rips : limits.crosscuts),
  );
  const inOrder = [...others].sort((a, b) => orderOfKinds.indexOf(a.kind) - orderOfKinds.indexOf(b.kind));
  return [
    { machine: preferred, preferred: true, owes: 0 },
    ...inOrder.map((machine) => ({ machine, preferred: false, owes: machine.cleanUp })),
  ];
}

/** Known by its kerf alone. */
function onlySaw(kind: CutKind, { kerf }: CutRequest): Tool {
  const machine: Machine = { id: kind, name: "", kind: "table", kerf: kerf[kind], cleanUp: noLimits.shortest, limits: noLimits };
  return { machine, preferred: true, owes: 0 };
}

const thinnest = (tools: readonly Tool[]): number => Math.min(...tools.map(({ machine }) => machine.kerf));
