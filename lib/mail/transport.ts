import "server-only";

const LOCAL = new Set(["127.0.0.1", "localhost"]);

/** How the mail server of an SMTP_URL is spoken to. Over a network never in the clear, not even when the server offers nothing better. */
export function transportOptions(smtpUrl: string) {
  const url = new URL(smtpUrl);
  const wrapped = url.protocol === "smtps:";
  const local = LOCAL.has(url.hostname);
  return {
    host: url.hostname,
    port: Number(url.port || (wrapped ? 465 : 587)),
    secure: wrapped,
    ...(url.username && { auth: { user: decodeURIComponent(url.username), pass: decodeURIComponent(url.password) } }),
    requireTLS: !local && !wrapped,
    ignoreTLS: local,
    connectionTimeout: 10_000, greetingTimeout: 10_000, socketTimeout: 30_000,
    disableFileAccess: true, disableUrlAccess: true,
  };
}
