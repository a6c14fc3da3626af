import { getSeamReadings } from "@/lib/schemas/figure";
import { seamReadings } from "@/lib/server/figure/seam-readings";
import { handle } from "@/lib/server/http/handle";

export const GET = handle(getSeamReadings, ({ access, params, request }) => seamReadings(access, params.faceId, request.signal));
