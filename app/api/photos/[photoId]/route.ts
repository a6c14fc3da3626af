import { deletePhoto, getPhoto } from "@/lib/schemas/photo";
import { handle } from "@/lib/server/http/handle";
import { readPhoto, removePhoto } from "@/lib/server/photos/photos";

export const GET = handle(getPhoto, async ({ access, params }) => readPhoto(access, params.photoId));
export const DELETE = handle(deletePhoto, async ({ access, params }) => {
  await removePhoto(access, params.photoId);
  return null;
});
