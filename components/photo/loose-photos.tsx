"use client";
import { useMutation, useQueryClient } from "@tanstack/react-query";
import Image from "next/image";
import Link from "next/link";
import { useState } from "react";
import { toast } from "sonner";
import { Moment } from "@/components/shell/moment";
import { Button, buttonClass } from "@/components/ui/button";
import { messageOf } from "@/lib/client/fault-from-server";
import { deletePhoto, photoKeys } from "@/lib/client/photo";
import type { Photo } from "@/lib/schemas/photo";

/** The first row of a wide screen. */
const eagerly = 4;

/** Photographs taken in and not yet used for a board. */
export function LoosePhotos({ photos, mayEdit }: { photos: readonly Photo[]; mayEdit: boolean }) {
  return (
    <ul className="grid gap-4 sm:grid-cols-2 lg:grid-cols-3 2xl:grid-cols-4">
      {photos.map((photo, index) => (
        <LoosePhoto key={photo.id} photo={photo} mayEdit={mayEdit} inView={index < eagerly} />
      ))}
    </ul>
  );
}

function LoosePhoto({ photo, mayEdit, inView }: { photo: Photo; mayEdit: boolean; inView: boolean }) {
  const level = photo.levels.at(-1);
  return (
    <li className="flex flex-col rounded-md border border-rule bg-sheet">
      {level && (
        <Image
          unoptimized
          src={level.url}
          alt={`Photograph ${photo.fileName}`}
          width={level.widthPx}
          height={level.heightPx}
          loading={inView ? "eager" : "lazy"}
          className="h-44 w-full rounded-t-md bg-graphite object-contain"
        />
      )}
      <div className="flex flex-1 flex-col gap-1 p-3 text-sm">
        <span className="truncate font-semibold">{photo.fileName}</span>
        <span className="text-pencil">
          {photo.takenAt ? "taken " : "came in "}
          <Moment at={photo.takenAt ?? photo.createdAt} />
          {photo.camera && `, ${photo.camera}`}
        </span>
        <span className="measure text-pencil">
          {photo.widthPx} × {photo.heightPx} px
        </span>
        {mayEdit && <PhotoActions photo={photo} />}
      </div>
    </li>
  );
}

function PhotoActions({ photo }: { photo: Photo }) {
  const client = useQueryClient();
  const [asking, setAsking] = useState(false);
  const remove = useMutation({
    mutationFn: () => deletePhoto(photo.id),
    onSuccess: () => client.invalidateQueries({ queryKey: photoKeys.loose }),
    onError: (error) => toast.error(messageOf(error)),
  });
  if (asking) {
    return (
      <div className="mt-auto flex flex-wrap items-center gap-2 pt-2">
        <span className="w-full">Remove it with its original? It cannot be brought back.</span>
        <Button size="small" kind="danger" disabled={remove.isPending} onClick={() => remove.mutate()}>
          Remove
        </Button>
        <Button size="small" onClick={() => setAsking(false)}>
          Keep
        </Button>
      </div>
    );
  }
  return (
    <div className="mt-auto flex flex-wrap gap-2 pt-2">
      <Link href={`/rack/take-in?photo=${photo.id}`} className={buttonClass("primary", "small")}>
        Make a board from it
      </Link>
      <Button size="small" kind="quiet" aria-label={`Remove ${photo.fileName}`} onClick={() => setAsking(true)}>
        Remove
      </Button>
    </div>
  );
}
