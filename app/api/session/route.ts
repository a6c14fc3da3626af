import * as endpoint from "@/lib/schemas/session";
import { env } from "@/lib/server/env";
import { callerAddress, callerDevice } from "@/lib/server/http/caller";
import { handle } from "@/lib/server/http/handle";
import { sessionOf, signIn, signOut } from "@/lib/server/sessions";

export const GET = handle(endpoint.getSession, async ({ access }) => sessionOf(access));

export const POST = handle(endpoint.signIn, async ({ body, request }) =>
  signIn(body, { address: callerAddress(request.headers, env().TRUSTED_PROXIES), device: callerDevice(request.headers) }),
);

export const DELETE = handle(endpoint.signOut, async ({ access }) => {
  await signOut(access);
  return null;
});
