import { getPhotoLevel } from "@/lib/schemas/photo";
import { handle } from "@/lib/server/http/handle";
import { photoLevel } from "@/lib/server/photos/photos";

export const GET = handle(getPhotoLevel, async ({ access, params }) => photoLevel(access, params.photoId, params.level));
