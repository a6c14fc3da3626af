"use client";
import Image from "next/image";
import { WoodStrip } from "@/components/picture/wood-strip";
import type { Board } from "@/lib/schemas/board";
import type { Straightening } from "@/lib/schemas/straightening";
import { ZonesOverlay, zonesWords } from "./zones-overlay";

/** The board as it lies in the rack: its straightened picture under the tape, with what was drawn on it. */
export function BoardPicture({ board, version }: { board: Board; version: Straightening }) {
  return (
    <figure>
      <WoodStrip label={`${board.tag} under the tape`} length={version.length} width={version.width}>
        {({ width, height }) => (
          <div className="relative" style={{ width, height }}>
            <VersionImage version={version} width={width} height={height} tag={board.tag} />
            <ZonesOverlay length={version.length} width={version.width} zones={version.zones} />
          </div>
        )}
      </WoodStrip>
      <figcaption className="mt-1 text-sm text-pencil">
        Version {version.version}. {zonesWords(version.zones)}.
      </figcaption>
    </figure>
  );
}

interface ImageProps {
  version: Straightening;
  width: number;
  height: number;
  tag: string;
}

/** The smallest level that still has a pixel for every pixel of the screen. */
function VersionImage({ version, width, height, tag }: ImageProps) {
  const wanted = width * window.devicePixelRatio;
  const level = version.levels.findLast(({ widthPx }) => widthPx >= wanted) ?? version.levels[0];
  if (!level) return null;
  return (
    <Image
      unoptimized
      priority
      src={level.url}
      alt={`${tag}, straightened`}
      width={level.widthPx}
      height={level.heightPx}
      className="block max-w-none"
      style={{ width, height }}
    />
  );
}
