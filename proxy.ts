import { NextResponse, type NextRequest } from "next/server";
import { env } from "@/lib/env";

/** Hosts of the file service, which the browser sends photos to and is redirected to for reading them. */
function fileHosts(): string {
  const { UPLOADTHING_INGEST_URL: ingest, UPLOADTHING_UFS_HOST: files } = env();
  if (!ingest) return "https://*.ingest.uploadthing.com https://*.ufs.sh";
  const { protocol } = new URL(ingest);
  return [new URL(ingest).origin, files ? `${protocol}//${files}` : ""].filter(Boolean).join(" ");
}

function policyWith(nonce: string): string {
  const dev = env().NODE_ENV === "development";
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${dev ? " 'unsafe-eval'" : ""}`,
    // Drawn parts carry sizes as style attributes; no style sheet of others can load.
    "style-src 'self' 'unsafe-inline'",
    `img-src 'self' blob: data: ${fileHosts()}`,
    "font-src 'self'",
    `connect-src 'self' ${fileHosts()}${dev ? " ws:" : ""}`,
    "worker-src 'self' blob:",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
    "frame-src 'none'",
  ].join("; ");
}

const PRIVATE_LINK = /^\/(join|follow|enter|verify|reset|confirm)\//;

/** Sets headers only; who may see what is decided where the data is read. */
export function proxy(request: NextRequest) {
  if (!["GET", "HEAD", "POST", "PUT", "DELETE", "OPTIONS"].includes(request.method)) return new NextResponse(null, { status: 405 });
  const nonce = Buffer.from(crypto.getRandomValues(new Uint8Array(16))).toString("base64");
  const policy = policyWith(nonce);
  const { pathname, search } = request.nextUrl;
  const headers = new Headers(request.headers);
  headers.set("x-nonce", nonce);
  headers.set("content-security-policy", policy);
  headers.set("x-path", pathname + search);
  const response = NextResponse.next({ request: { headers } });
  const isApi = pathname.startsWith("/api/");
  response.headers.set("content-security-policy", isApi ? "default-src 'none'; frame-ancestors 'none'; sandbox" : policy);
  response.headers.set("x-content-type-options", "nosniff");
  response.headers.set("x-frame-options", "DENY");
  // The path of a private link is its secret. Not `no-referrer`: with it a browser sends the page's own form with the origin "null".
  response.headers.set("referrer-policy", PRIVATE_LINK.test(pathname) ? "strict-origin" : "same-origin");
  response.headers.set("cross-origin-opener-policy", "same-origin");
  response.headers.set("cross-origin-resource-policy", "same-origin");
  response.headers.set("permissions-policy", "camera=(self), geolocation=(), microphone=(), payment=(), usb=()");
  if (!isApi) response.headers.set("cache-control", "private, no-store");
  if (env().APP_URL.startsWith("https://")) response.headers.set("strict-transport-security", "max-age=63072000; includeSubDomains");
  return response;
}

export const config = { matcher: [{ source: "/((?!_next/static|fonts/|icon).*)" }] };
