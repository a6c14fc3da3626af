import { getShowSidePng } from "@/lib/schemas/layout";
import { fileResponse } from "@/lib/server/http/binary";
import { handle } from "@/lib/server/http/handle";
import { showSidePng } from "@/lib/server/layouts/show-side";

export const GET = handle(getShowSidePng, async ({ access, params, query }) =>
  fileResponse({
    bytes: await showSidePng(access, params.faceId, query.pxPerMm),
    kind: "image/png",
    fileName: "show-side.png",
    immutable: false,
  }),
);
