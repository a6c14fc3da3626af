import { saveZones as endpoint } from "@/lib/schemas/straightening";
import { handle } from "@/lib/server/http/handle";
import { saveZones } from "@/lib/server/straightenings/save-zones";

export const PUT = handle(endpoint, async ({ access, params, body }) => saveZones(access, params.straighteningId, body));
