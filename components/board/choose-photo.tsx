"use client";
/** Which photograph to mark a side of a board on: the one it was marked on last, a new one, or one that no board uses yet. */
import { useQuery } from "@tanstack/react-query";
import Image from "next/image";
import Link from "next/link";
import { FileSources } from "@/components/photo/file-sources";
import { UploadList } from "@/components/photo/upload-list";
import { useUploads } from "@/components/photo/use-uploads";
import { buttonClass } from "@/components/ui/button";
import { Modal } from "@/components/ui/modal";
import { Notice } from "@/components/ui/notice";
import { messageOf } from "@/lib/client/fault-from-server";
import { loosePhotosQuery } from "@/lib/client/photo";
import type { BoardSide } from "@/lib/schemas/straightening";
import { markAddress } from "./board-address";

interface Props {
  boardId: string;
  side: BoardSide;
  /** Of the same side. */
  lastPhotoId: string | null;
  open: boolean;
  onOpenChange: (open: boolean) => void;
}

export function ChoosePhoto({ boardId, side, lastPhotoId, open, onOpenChange }: Props) {
  const loose = useQuery({ ...loosePhotosQuery(), enabled: open });
  const markAt = (photoId: string) => markAddress(boardId, photoId, side);
  return (
    <Modal
      open={open}
      onOpenChange={onOpenChange}
      title={side === "back" ? "Mark the back on which photograph?" : "Mark on which photograph?"}
      {...(side === "back" && {
        lead: "Turn the board over about its long edge, so that its left end stays left, and photograph it from above.",
      })}
    >
      <div className="flex flex-col gap-4">
        {open && <NewPhoto />}
        {lastPhotoId && (
          <Link href={markAt(lastPhotoId)} className={buttonClass("primary")}>
            The one it was marked on last
          </Link>
        )}
        {loose.isError && <Notice kind="stop">{messageOf(loose.error)}</Notice>}
        {loose.data && loose.data.items.length === 0 && <p className="text-pencil">No photograph waits.</p>}
        <ul className="grid grid-cols-2 gap-3">
          {loose.data?.items.map((photo) => {
            const level = photo.levels.at(-1);
            return (
              <li key={photo.id}>
                <Link href={markAt(photo.id)} className="block rounded-md border border-rule hover:border-chalk">
                  {level && (
                    <Image
                      unoptimized
                      src={level.url}
                      alt=""
                      width={level.widthPx}
                      height={level.heightPx}
                      className="h-28 w-full rounded-t-md bg-graphite object-contain"
                    />
                  )}
                  <span className="block truncate px-2 py-1.5 text-sm">{photo.fileName}</span>
                </Link>
              </li>
            );
          })}
        </ul>
      </div>
    </Modal>
  );
}

/** Taken in here it is among the others at once. */
function NewPhoto() {
  const uploads = useUploads();
  return (
    <>
      <FileSources onFiles={uploads.add} />
      <UploadList uploads={uploads} />
    </>
  );
}
