import { NextResponse, type NextRequest } from "next/server";
import { methodsOf } from "@/lib/doors";
import { env } from "@/lib/env";
import { routes } from "@/lib/routes";

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

const API_POLICY = "default-src 'none'; frame-ancestors 'none'; sandbox";
const METHODS: readonly string[] = ["GET", "HEAD", "POST", "PUT", "DELETE", "OPTIONS"];

function setHeaders({ headers }: NextResponse, pathname: string, policy: string): void {
  headers.set("content-security-policy", policy);
  headers.set("x-content-type-options", "nosniff");
  headers.set("x-frame-options", "DENY");
  // The path of a private link is its secret. Not `no-referrer`: with it a browser sends the page's own form with the origin "null".
  headers.set("referrer-policy", PRIVATE_LINK.test(pathname) ? "strict-origin" : "same-origin");
  headers.set("cross-origin-opener-policy", "same-origin");
  headers.set("cross-origin-resource-policy", "same-origin");
  headers.set("permissions-policy", "camera=(self), geolocation=(), microphone=(), payment=(), usb=()");
  if (env().APP_URL.startsWith("https://")) headers.set("strict-transport-security", "max-age=63072000; includeSubDomains");
}

/** A problem document (RFC 9457) where no door is, or none for this method; null where there is one. The framework would answer with a page, or with nothing. */
function noSuchDoor(pathname: string, method: string): NextResponse | null {
  const known = methodsOf(pathname);
  const allowed = known && ["OPTIONS", ...(known.includes("GET") ? ["HEAD"] : []), ...known];
  if (allowed?.includes(method)) return null;
  const [code, status, title] = allowed ? ["no-such-method", 405, `This takes ${allowed.join(", ")}.`] as const : ["not-found", 404, "There is nothing at this address."] as const;
  const headers = { "content-type": "application/problem+json; charset=utf-8", "cache-control": "no-store", ...(allowed && { allow: allowed.join(", ") }) };
  return new NextResponse(JSON.stringify({ type: routes.problems(code), status, title, instance: `urn:uuid:${crypto.randomUUID()}` }), { status, headers });
}

/** Sets headers, and turns away what is addressed to no door; who may see what is decided where the data is read. */
export function proxy(request: NextRequest) {
  const { pathname, search } = request.nextUrl;
  if (pathname.startsWith("/api/")) {
    const response = noSuchDoor(pathname, request.method) ?? NextResponse.next();
    setHeaders(response, pathname, API_POLICY);
    return response;
  }
  const nonce = Buffer.from(crypto.getRandomValues(new Uint8Array(16))).toString("base64");
  const policy = policyWith(nonce);
  const headers = new Headers(request.headers);
  headers.set("x-nonce", nonce);
  headers.set("content-security-policy", policy);
  headers.set("x-path", pathname + search);
  const response = METHODS.includes(request.method) ? NextResponse.next({ request: { headers } }) : new NextResponse(null, { status: 405, headers: { allow: METHODS.join(", ") } });
  setHeaders(response, pathname, policy);
  response.headers.set("cache-control", "private, no-store");
  return response;
}

export const config = { matcher: [{ source: "/((?!_next/static|fonts/|icon).*)" }] };
