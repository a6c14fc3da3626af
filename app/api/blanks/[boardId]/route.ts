import { takeApartBlank as endpoint } from "@/lib/schemas/blank";
import { takeApart } from "@/lib/server/blanks/take-apart";
import { handle } from "@/lib/server/http/handle";

export const DELETE = handle(endpoint, async ({ access, params }) => {
  await takeApart(access, params.boardId);
  return null;
});
