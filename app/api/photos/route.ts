import { listLoosePhotos, uploadPhoto } from "@/lib/schemas/photo";
import { handle } from "@/lib/server/http/handle";
import { readLoosePhotos } from "@/lib/server/photos/photos";
import { takeInPhoto } from "@/lib/server/photos/take-in-photo";

export const GET = handle(listLoosePhotos, async ({ access, query }) => ({ items: await readLoosePhotos(access, query.limit) }));
export const POST = handle(uploadPhoto, async ({ access, query, request }) => takeInPhoto(access, query, request));
