/** Jobs and faces, from the browser. */
import { keepPreviousData, queryOptions } from "@tanstack/react-query";
import type { BodySent, QuerySent } from "@/lib/schemas/endpoint";
import * as endpoint from "@/lib/schemas/job";
import { call } from "./call";

export const jobKeys = {
  all: ["jobs"] as const,
  one: (jobId: string) => ["jobs", jobId] as const,
};

export const jobsQuery = (query: QuerySent<typeof endpoint.listJobs>) =>
  queryOptions({
    queryKey: [...jobKeys.all, "list", query],
    queryFn: ({ signal }) => call(endpoint.listJobs, { query }, signal),
    placeholderData: keepPreviousData,
  });

export const jobQuery = (jobId: string) =>
  queryOptions({ queryKey: jobKeys.one(jobId), queryFn: ({ signal }) => call(endpoint.getJob, { params: { jobId } }, signal) });

export const createJob = (body: BodySent<typeof endpoint.createJob>) => call(endpoint.createJob, { body });

export const updateJob = (jobId: string, body: BodySent<typeof endpoint.updateJob>) =>
  call(endpoint.updateJob, { params: { jobId }, body });

export const createFace = (jobId: string, body: BodySent<typeof endpoint.createFace>) =>
  call(endpoint.createFace, { params: { jobId }, body });

export const renameFace = (faceId: string, title: string) => call(endpoint.renameFace, { params: { faceId }, body: { title } });

export const deleteFace = (faceId: string) => call(endpoint.deleteFace, { params: { faceId } });
