import "server-only";
import { createTransport, type Transporter } from "nodemailer";
import { env } from "@/lib/env";

/** Thrown when trying again can't help: the server refuses the address or the message for good. */
export class FinalMailError extends Error {
  override name = "FinalMailError";
}

let known: Transporter | undefined;

function transport(): Transporter {
  const url = new URL(env().SMTP_URL);
  const local = url.hostname === "127.0.0.1" || url.hostname === "localhost";
  return (known ??= createTransport({
    host: url.hostname, port: Number(url.port || (url.protocol === "smtps:" ? 465 : 587)), secure: url.protocol === "smtps:",
    ...(url.username && { auth: { user: decodeURIComponent(url.username), pass: decodeURIComponent(url.password) } }),
    // Never in the clear over a network, not even when a server offers nothing better.
    requireTLS: !local && url.protocol !== "smtps:", ignoreTLS: local,
    connectionTimeout: 10_000, greetingTimeout: 10_000, socketTimeout: 30_000,
    disableFileAccess: true, disableUrlAccess: true,
  }));
}

export type Outgoing = { to: string; messageId: string; subject: string; html: string; text: string };

/** Hands one message to the mail server; the envelope holds exactly the stored address. */
export async function sendMail({ to, messageId, subject, html, text }: Outgoing): Promise<void> {
  const from = /^(.*?)\s*<([^<>]+)>$/.exec(env().MAIL_FROM);
  const sender = from ? { name: from[1] ?? "", address: from[2] ?? "" } : { name: "", address: env().MAIL_FROM };
  try {
    await transport().sendMail({ from: sender, to: { name: "", address: to }, envelope: { from: sender.address, to: [to] }, messageId, subject, html, text, headers: { "auto-submitted": "auto-generated" } });
  } catch (cause) {
    const code = cause instanceof Error && "responseCode" in cause ? Number(cause.responseCode) : 0;
    if (code >= 500 && code < 600) throw new FinalMailError(cause instanceof Error ? cause.message : "refused", { cause });
    throw cause;
  }
}
