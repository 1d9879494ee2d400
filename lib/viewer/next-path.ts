// Backslashes and control characters are read as slashes or dropped by browsers, so that `/\e` or `/<tab>/e` would lead to another site.
const PLAIN_PATH = /^\/(?![/\\])[A-Za-z0-9\-._~/?&=%+:@,;]*$/;
const HIDDEN = /%(?:5c|2f|0[0-9a-f]|1[0-9a-f]|7f)/i;
/** A made-up host: what resolves away from it was no path of ours. */
const HERE = "http://here.invalid";

/** Where to go after sign-in: the path asked for when it is one of our own, else null. */
export function safeNext(asked: string | null | undefined): string | null {
  if (!asked || asked.length > 500 || !PLAIN_PATH.test(asked) || asked.includes("//") || HIDDEN.test(asked)) return null;
  const url = new URL(asked, HERE);
  if (url.origin !== HERE || url.pathname.startsWith("/api/")) return null;
  return url.pathname + url.search;
}
