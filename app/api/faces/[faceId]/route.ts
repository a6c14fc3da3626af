import * as endpoint from "@/lib/schemas/job";
import { handle } from "@/lib/server/http/handle";
import { changeFaceTitle, removeFace } from "@/lib/server/jobs/faces";

export const PATCH = handle(endpoint.renameFace, async ({ access, params, body }) =>
  changeFaceTitle(access, params.faceId, body.title),
);

export const DELETE = handle(endpoint.deleteFace, async ({ access, params }) => {
  await removeFace(access, params.faceId);
  return null;
});
