import "server-only";
import { env } from "@/lib/env";

/** Scheme and host as the browser addressed them, so that what is linked stays on the same site. */
export function requestOrigin(request: Request): string {
  const headers = request.headers;
  const first = (name: string) => headers.get(name)?.split(",")[0]?.trim() || null;
  const forwarded = env().TRUST_PROXY ? first("x-forwarded-host") : null;
  const configured = new URL(env().NEXTAUTH_URL);
  const scheme =
    (env().TRUST_PROXY ? first("x-forwarded-proto") : null) ?? configured.protocol.slice(0, -1);
  return `${scheme}://${forwarded ?? first("host") ?? configured.host}`;
}
