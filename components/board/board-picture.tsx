"use client";
import Image from "next/image";
import type { ReactNode } from "react";
import { WoodStrip } from "@/components/picture/wood-strip";
import { mmFromUm, um } from "@/lib/layout";
import type { Board } from "@/lib/schemas/board";
import type { Straightening } from "@/lib/schemas/straightening";
import { SidesNotice } from "./sides-notice";
import { ZonesOverlay, zonesWords } from "./zones-overlay";

interface Props {
  board: Board;
  face: Straightening;
  back: Straightening | null;
  /** What can be done with the back. */
  children?: ReactNode;
}

/**
 * The board as it lies in the rack under the tape, with what was drawn on it; below it its back, at the same scale, as it lies once the
 * board is turned over about its long edge.
 */
export function BoardPicture({ board, face, back, children }: Props) {
  const longest = um(Math.max(face.length, back?.length ?? 0));
  const widest = um(Math.max(face.width, back?.width ?? 0));
  return (
    <div className="flex flex-col gap-2">
      <WoodStrip label={`${board.tag} under the tape`} length={longest} width={widest}>
        {({ pxPerMm }) => (
          <>
            <Side board={board} version={face} pxPerMm={pxPerMm} />
            {back && (
              <>
                <p className="sticky left-0 w-fit py-1 text-sm text-pencil">
                  The back, turned over about the long edge: its upper edge is the face's lower one.
                </p>
                <Side board={board} version={back} pxPerMm={pxPerMm} />
              </>
            )}
          </>
        )}
      </WoodStrip>
      <p className="text-sm text-pencil">
        {back && "Face: "}Version {face.version}. {zonesWords(face.zones)}.
        {back && (
          <span className="block">
            Back: Version {back.version}. {zonesWords(back.zones)}.
          </span>
        )}
      </p>
      {back && <SidesNotice face={face} back={back} />}
      {back && children && <div className="flex flex-wrap gap-2">{children}</div>}
    </div>
  );
}

interface SideProps {
  board: Board;
  version: Straightening;
  pxPerMm: number;
}

function Side({ board, version, pxPerMm }: SideProps) {
  const size = { width: mmFromUm(version.length) * pxPerMm, height: mmFromUm(version.width) * pxPerMm };
  const name = version.side === "back" ? `the back of ${board.tag}` : board.tag;
  return (
    <figure
      className="relative"
      style={size}
      aria-label={version.side === "back" ? `Back of ${board.tag}` : `Face of ${board.tag}`}
    >
      <VersionImage version={version} {...size} name={name} />
      <ZonesOverlay length={version.length} width={version.width} zones={version.zones} />
    </figure>
  );
}

interface ImageProps {
  version: Straightening;
  width: number;
  height: number;
  name: string;
}

/** The smallest level that still has a pixel for every pixel of the screen. */
function VersionImage({ version, width, height, name }: ImageProps) {
  const wanted = width * window.devicePixelRatio;
  const level = version.levels.findLast(({ widthPx }) => widthPx >= wanted) ?? version.levels[0];
  if (!level) return null;
  return (
    <Image
      unoptimized
      priority
      src={level.url}
      alt={`${name}, straightened`}
      width={level.widthPx}
      height={level.heightPx}
      className="block max-w-none"
      style={{ width, height }}
    />
  );
}
