/** Security headers on every answer, with a fresh nonce for the scripts of each page. */
import { type NextRequest, NextResponse } from "next/server";

function contentSecurityPolicy(nonce: string): string {
  // Development builds evaluate source maps and reload over a web socket.
  const dev = process.env.NODE_ENV === "development";
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${dev ? " 'unsafe-eval'" : ""}`,
    // Element style attributes carry positions on the layout table; no nonce can cover attributes.
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' blob: data:",
    "font-src 'self'",
    `connect-src 'self'${dev ? " ws:" : ""}`,
    "worker-src 'self' blob:",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join("; ");
}

export function proxy(request: NextRequest): NextResponse {
  const nonce = btoa(crypto.randomUUID());
  const policy = contentSecurityPolicy(nonce);
  const headers = new Headers(request.headers);
  headers.set("x-nonce", nonce);
  headers.set("x-path", request.nextUrl.pathname + request.nextUrl.search);
  headers.set("content-security-policy", policy);

  const response = NextResponse.next({ request: { headers } });
  response.headers.set("content-security-policy", policy);
  response.headers.set("x-content-type-options", "nosniff");
  response.headers.set("x-frame-options", "DENY");
  response.headers.set("referrer-policy", "strict-origin-when-cross-origin");
  response.headers.set("permissions-policy", "camera=(self), microphone=(), geolocation=()");
  response.headers.set("cross-origin-opener-policy", "same-origin");
  return response;
}

export const config = {
  // Files with hashed names and the API, whose answers carry their own headers, go without; pages never do.
  matcher: [{ source: "/((?!_next/static|_next/image|fonts/|icon.svg|api/).*)" }],
};
