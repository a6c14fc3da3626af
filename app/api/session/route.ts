import * as endpoint from "@/lib/schemas/session";
import { callerAddress, callerDevice } from "@/lib/server/http/caller";
import { handle } from "@/lib/server/http/handle";
import { sessionOf, signIn, signOut } from "@/lib/server/sessions";

export const GET = handle(endpoint.getSession, async ({ access }) => sessionOf(access));

export const POST = handle(endpoint.signIn, async ({ body, request }) =>
  signIn(body, { address: callerAddress(request), device: callerDevice(request) }),
);

export const DELETE = handle(endpoint.signOut, async ({ access }) => {
  await signOut(access);
  return null;
});
