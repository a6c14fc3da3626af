"use client";
import { useQuery } from "@tanstack/react-query";
import Link from "next/link";
import { buttonClass } from "@/components/ui/button";
import { PageTitle } from "@/components/ui/page-title";
import { loosePhotosQuery } from "@/lib/client/photo";
import type { Photo } from "@/lib/schemas/photo";
import { FileSources } from "./file-sources";
import { LoosePhotos } from "./loose-photos";
import { UploadList } from "./upload-list";
import { useUploads } from "./use-uploads";

/** Where wood comes in: photographs first, boards from them. */
export function TakeInScreen({ photos, mayEdit }: { photos: readonly Photo[]; mayEdit: boolean }) {
  const uploads = useUploads();
  const loose = useQuery({ ...loosePhotosQuery(), initialData: { items: [...photos] } });
  const { items } = loose.data;
  return (
    <>
      <PageTitle
        title={mayEdit ? "Take in wood" : "Add photographs"}
        above={
          <Link href="/rack" className="underline">
            Rack
          </Link>
        }
      >
        {mayEdit && (
          <Link href="/rack/take-in?photo=none" className={buttonClass()}>
            Enter a board without a photograph
          </Link>
        )}
      </PageTitle>
      <div className="flex flex-col gap-6 p-4 md:p-5">
        <FileSources onFiles={uploads.add} />
        <UploadList uploads={uploads} />
        <section aria-labelledby="loose-photographs">
          <h2 id="loose-photographs" className="mb-3 text-xl">
            Photographs not yet used
          </h2>
          {items.length === 0 ? (
            <p className="max-w-prose text-pencil">
              None. Photograph each board from above with the whole board in the picture; lay a sheet of A4 or Letter paper on it
              if you do not know its size.{" "}
              {mayEdit ? "Then make a board from the photograph here." : "A maker then makes boards of them."}
            </p>
          ) : (
            <LoosePhotos photos={items} mayEdit={mayEdit} />
          )}
        </section>
      </div>
    </>
  );
}
