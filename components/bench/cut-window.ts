/** Which part of the board the bench shows for a cut: the part in hand about the blade, with the edge to measure from where it fits. */
import { type CutStep, mmFromUm } from "@/lib/layout";
import type { WoodWindow } from "../order/wood-view";

/** Wider than this against its height, wood becomes a thread on a phone. */
const widest = 5.5;
/** Narrower, the drawing pushes the setting off the screen. */
const narrowest = 2.6;

export interface CutGeometry {
  readonly window: WoodWindow;
  /** The part in hand, mm. */
  readonly part: WoodWindow;
  /** What the blade takes, mm. */
  readonly blade: WoodWindow;
  /** Where the setting is measured: from the edge to the side of the blade, along x or y, mm. */
  readonly measure: { readonly axis: "x" | "y"; readonly from: number; readonly to: number };
}

export function cutGeometry(cut: CutStep): CutGeometry {
  const part = inMm(cut.part.rect);
  const blade = inMm(cut.kerf);
  const axis = cut.fromEdge === "left" || cut.fromEdge === "right" ? "x" : "y";
  const low = cut.fromEdge === "left" || cut.fromEdge === "top";
  const from = axis === "x" ? (low ? part.x : part.x + part.width) : low ? part.y : part.y + part.height;
  const setting = mmFromUm(cut.setting);
  return {
    window: windowOf(part, blade, axis, from),
    part,
    blade,
    measure: { axis, from, to: low ? from + setting : from - setting },
  };
}

function windowOf(part: WoodWindow, blade: WoodWindow, axis: "x" | "y", from: number): WoodWindow {
  const rim = part.height * 0.14;
  const height = part.height + 2 * rim;
  const y = part.y - rim;
  const most = height * widest;
  const whole = { x: part.x - rim, width: part.width + 2 * rim };
  if (whole.width <= most) return centred(whole, y, height);
  // Along a rip all places look alike: show the end at which the part begins.
  if (axis === "y") return { x: whole.x, y, width: height * 4, height };
  const at = blade.x + blade.width / 2;
  const spread = Math.abs(at - from) + 3 * rim;
  const width = Math.max(height * narrowest, Math.min(spread * 1.35, most));
  const near = Math.min(from, at) - 1.5 * rim;
  const start = spread * 1.35 <= most ? (from <= at ? near : Math.max(from, at) + 1.5 * rim - width) : at - width / 2;
  return { x: Math.max(whole.x, Math.min(start, whole.x + whole.width - width)), y, width, height };
}

function centred(whole: { readonly x: number; readonly width: number }, y: number, height: number): WoodWindow {
  const width = Math.max(whole.width, height * narrowest);
  return { x: whole.x - (width - whole.width) / 2, y, width, height };
}

function inMm(rect: CutStep["kerf"]): WoodWindow {
  return { x: mmFromUm(rect.x), y: mmFromUm(rect.y), width: mmFromUm(rect.width), height: mmFromUm(rect.height) };
}
