import { getFaceMovement, saveFaceMovement } from "@/lib/schemas/movement";
import { handle } from "@/lib/server/http/handle";
import { chooseFaceMovement, readFaceMovement } from "@/lib/server/movement/face-movement";

export const GET = handle(getFaceMovement, async ({ access, params }) => readFaceMovement(access.shopId, params.faceId));
export const PUT = handle(saveFaceMovement, async ({ access, body, params }) => chooseFaceMovement(access, params.faceId, body));
