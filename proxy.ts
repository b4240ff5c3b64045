import { type NextRequest, NextResponse } from "next/server";

/** Sets headers only. Who may see what is decided by the pages, actions and routes themselves. */
export function proxy(request: NextRequest): NextResponse {
  const nonce = btoa(crypto.randomUUID());
  const store = new URL(
    process.env.S3_PUBLIC_ENDPOINT || process.env.S3_ENDPOINT || "http://127.0.0.1",
  ).origin;
  const isDevelopment = process.env.NODE_ENV === "development";
  const policy = [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic' 'wasm-unsafe-eval'${isDevelopment ? " 'unsafe-eval'" : ""}`,
    // React, the editor and the viewer set style attributes.
    "style-src 'self' 'unsafe-inline'",
    `img-src 'self' blob: data: ${store}`,
    `connect-src 'self' ${store}${isDevelopment ? " ws:" : ""}`,
    "worker-src 'self' blob:",
    "font-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join("; ");

  const headers = new Headers(request.headers);
  headers.set("content-security-policy", policy);
  headers.set("x-nonce", nonce);
  headers.set("x-riverline-path", request.nextUrl.pathname + request.nextUrl.search);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set("content-security-policy", policy);
  return response;
}

export const config = {
  // Routes under /api stream bodies, which a proxy would cut short.
  matcher: [
    {
      source: "/((?!api/|_next/static|_next/image|icon.svg).*)",
      missing: [{ type: "header", key: "next-router-prefetch" }],
    },
  ],
};
