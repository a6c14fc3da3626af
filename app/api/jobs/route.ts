import * as endpoint from "@/lib/schemas/job";
import { handle } from "@/lib/server/http/handle";
import { openJob, readJobs } from "@/lib/server/jobs/jobs";

export const GET = handle(endpoint.listJobs, async ({ access, query }) => readJobs(access, query));
export const POST = handle(endpoint.createJob, async ({ access, body }) => openJob(access, body));
