import { createFace } from "@/lib/schemas/job";
import { handle } from "@/lib/server/http/handle";
import { addFace } from "@/lib/server/jobs/faces";

export const POST = handle(createFace, async ({ access, params, body }) => addFace(access, params.jobId, body));
