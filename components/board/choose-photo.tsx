"use client";
/** Which photograph to mark a board on: the one it was marked on last, or one that no board uses yet. */
import { useQuery } from "@tanstack/react-query";
import Image from "next/image";
import Link from "next/link";
import { buttonClass } from "@/components/ui/button";
import { Modal } from "@/components/ui/modal";
import { Notice } from "@/components/ui/notice";
import { messageOf } from "@/lib/client/fault-from-server";
import { loosePhotosQuery } from "@/lib/client/photo";

interface Props {
  boardId: string;
  lastPhotoId: string | null;
  open: boolean;
  onOpenChange: (open: boolean) => void;
}

export function ChoosePhoto({ boardId, lastPhotoId, open, onOpenChange }: Props) {
  const loose = useQuery({ ...loosePhotosQuery(), enabled: open });
  const markAt = (photoId: string) => `/rack/${boardId}/mark?photo=${photoId}`;
  return (
    <Modal open={open} onOpenChange={onOpenChange} title="Mark on which photograph?">
      <div className="flex flex-col gap-4">
        {lastPhotoId && (
          <Link href={markAt(lastPhotoId)} className={buttonClass("primary")}>
            The one it was marked on last
          </Link>
        )}
        {loose.isError && <Notice kind="stop">{messageOf(loose.error)}</Notice>}
        {loose.data && loose.data.items.length === 0 && (
          <p className="text-pencil">
            No other photograph waits.{" "}
            <Link href="/rack/take-in" className="text-chalk underline">
              Take one in
            </Link>
          </p>
        )}
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
