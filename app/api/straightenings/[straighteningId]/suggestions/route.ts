import { getSuggestions } from "@/lib/schemas/figure";
import { suggestionsOf } from "@/lib/server/figure/suggestions";
import { handle } from "@/lib/server/http/handle";

export const GET = handle(getSuggestions, ({ access, params, request }) =>
  suggestionsOf(access, params.straighteningId, request.signal),
);
