import * as endpoint from "@/lib/schemas/job";
import { handle } from "@/lib/server/http/handle";
import { changeJob, readJob } from "@/lib/server/jobs/jobs";

export const GET = handle(endpoint.getJob, async ({ access, params }) => readJob(access, params.jobId));
export const PATCH = handle(endpoint.updateJob, async ({ access, params, body }) => changeJob(access, params.jobId, body));
