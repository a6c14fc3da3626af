"use client";
import { type BoardSize, sidesCheck } from "@/lib/layout";
import { sidesWords } from "@/lib/words/sides";
import { useUnits } from "../shell/units";
import { Notice } from "../ui/notice";

/** Says by how much face and back came out at different sizes; nothing while they agree. */
export function SidesNotice({ face, back }: { face: BoardSize; back: BoardSize }) {
  const { style } = useUnits();
  const check = sidesCheck(face, back);
  return check.agree ? null : <Notice kind="care">{sidesWords(check, style)}</Notice>;
}
