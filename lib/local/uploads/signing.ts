import { createHmac, timingSafeEqual } from "node:crypto";

/** What the token of an application says. */
export type Token = { apiKey: string; appId: string };

const PREFIX = "hmac-sha256=";

/** Reads the token as the client library does: base64 of a JSON object. */
export function readToken(token: string): Token {
  const { apiKey, appId } = JSON.parse(Buffer.from(token, "base64").toString("utf8")) as Partial<Token>;
  if (typeof apiKey !== "string" || !apiKey.startsWith("sk_") || typeof appId !== "string" || !/^[\w-]+$/.test(appId)) {
    throw new Error("The upload token is base64 of {apiKey: \"sk_...\", appId, regions}.");
  }
  return { apiKey, appId };
}

/** The signature of a text, as it stands in an address or a header. */
export const sign = (text: string, apiKey: string) => PREFIX + createHmac("sha256", apiKey).update(text).digest("hex");

/** Why a signed address is not good, or null. The signature is the last parameter and covers all that stands before it. */
export function faultOfSignedUrl(url: URL, apiKey: string, now = Date.now()): string | null {
  const cut = url.href.indexOf("&signature=");
  if (cut < 0) return "Missing signature";
  if (!same(sign(url.href.slice(0, cut), apiKey), url.searchParams.getAll("signature").join())) return "Invalid signature";
  if (url.href.indexOf("&", cut + 1) >= 0) return "Invalid signature";
  return Number(url.searchParams.get("expires")) > now ? null : "URL expired";
}

/** An address with an expiry and a signature over everything before it. */
export function signUrl(address: string, apiKey: string, seconds: number): string {
  const url = new URL(address);
  url.searchParams.append("expires", String(Date.now() + seconds * 1000));
  url.searchParams.append("signature", sign(url.href, apiKey));
  return url.href;
}

/** Compares two secrets without telling by the time taken where they differ. */
export function same(one: string, other: string): boolean {
  const [a, b] = [Buffer.from(one), Buffer.from(other)];
  return a.length === b.length && timingSafeEqual(a, b);
}
