import * as endpoint from "@/lib/schemas/session";
import { handle } from "@/lib/server/http/handle";
import { signOutEverywhere } from "@/lib/server/sessions";

export const DELETE = handle(endpoint.signOutEverywhere, async ({ access }) => ({ ended: await signOutEverywhere(access) }));
