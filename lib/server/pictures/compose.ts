/** The picture of a blank in levels, from the straightened pictures of its boards. Runs in a worker thread. */
import "server-only";
import sharp from "sharp";
import { type BlankStrip, blankScale, type MemberPicture, type Pixels, paintStrip, type Um } from "@/lib/layout";
import { type EncodedLevel, encodeLevels } from "./encode-levels";
import type { Step } from "./straighten";

export interface MemberRequest {
  /** One level of the board's straightened picture. */
  readonly bytes: Uint8Array;
  /** Of that level. */
  readonly pxPerMmAlong: number;
  readonly pxPerMmAcross: number;
  /** Of the full picture: the blank's is no finer. */
  readonly fullPxPerMm: number;
  readonly strip: Pick<BlankStrip, "blankFromMember" | "rect">;
}

export interface ComposeRequest {
  readonly length: Um;
  readonly width: Um;
  /** From the upper edge down. */
  readonly members: readonly MemberRequest[];
}

export interface ComposedPicture {
  /** Stored pictures are whole: one that cannot be read is a fault of ours and throws. */
  readonly ok: true;
  readonly widthPx: number;
  readonly heightPx: number;
  readonly pxPerMm: number;
  readonly levels: readonly EncodedLevel[];
}

/** Rough share of the time, the rest is encoding. */
const painted = 0.5;

/** Decodes one board after the other, so that no more than one lies in memory beside the blank. */
export async function composeInThread({ length, width, members }: ComposeRequest, step: Step): Promise<ComposedPicture> {
  step(0);
  const finest = members.map(({ fullPxPerMm }) => fullPxPerMm);
  const { pxPerMm, widthPx, heightPx } = blankScale(length, width, finest);
  const picture: Pixels = { data: new Uint8Array(widthPx * heightPx * 3), width: widthPx, height: heightPx, channels: 3 };
  const strips = members.map(({ strip }) => strip);
  for (const [index, member] of members.entries()) {
    const decoded = await pictureOf(member);
    for (const share of paintStrip(picture, pxPerMm, strips, index, decoded)) {
      step((painted * (index + share)) / members.length);
    }
  }
  const levels = await encodeLevels(picture, (share) => step(painted + (1 - painted) * share));
  return { ok: true, widthPx, heightPx, pxPerMm, levels };
}

async function pictureOf({ bytes, pxPerMmAlong, pxPerMmAcross }: MemberRequest): Promise<MemberPicture> {
  const { data, info } = await sharp(bytes).removeAlpha().toColourspace("srgb").raw().toBuffer({ resolveWithObject: true });
  if (info.channels !== 3) throw new Error(`a straightened picture has ${info.channels} channels`);
  const pixels: Pixels = { data, width: info.width, height: info.height, channels: 3 };
  return { pixels, pxPerMmAlong, pxPerMmAcross };
}
