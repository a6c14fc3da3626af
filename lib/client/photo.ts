/** Photographs taken in, from the browser. Uploading is `upload-photo.ts`. */
import { queryOptions } from "@tanstack/react-query";
import * as endpoint from "@/lib/schemas/photo";
import { call } from "./call";

export const photoKeys = {
  loose: ["photos", "loose"] as const,
};

export const loosePhotosQuery = () =>
  queryOptions({ queryKey: photoKeys.loose, queryFn: ({ signal }) => call(endpoint.listLoosePhotos, {}, signal) });

export const deletePhoto = (photoId: string) => call(endpoint.deletePhoto, { params: { photoId } });
