/** Signing in and out. */
import { z } from "zod";
import { defineEndpoint, roles } from "./endpoint";
import { idSchema } from "./ids";

export const signInSchema = z.object({
  email: z.email("Write the e-mail address in full").max(254),
  password: z.string().min(1, "Enter your password").max(200),
});

export const sessionSchema = z.object({
  user: z.object({ id: idSchema, name: z.string(), email: z.string() }),
  shop: z.object({ id: idSchema, name: z.string() }),
  role: z.enum(roles),
});
export type Session = z.output<typeof sessionSchema>;

export const signIn = defineEndpoint({
  method: "POST",
  path: "/api/session",
  summary: "Sign in",
  tag: "session",
  access: "public",
  body: signInSchema,
  response: sessionSchema,
});

export const getSession = defineEndpoint({
  method: "GET",
  path: "/api/session",
  summary: "Who is signed in",
  tag: "session",
  access: roles,
  response: sessionSchema,
});

export const signOut = defineEndpoint({
  method: "DELETE",
  path: "/api/session",
  summary: "Sign out on this device",
  tag: "session",
  access: roles,
  response: null,
});

export const signOutEverywhere = defineEndpoint({
  method: "DELETE",
  path: "/api/sessions",
  summary: "Sign out on every device",
  tag: "session",
  access: roles,
  response: z.object({ ended: z.int() }),
});
