import "server-only";
import { createTransport, type Transporter } from "nodemailer";
import { env } from "@/lib/env";
import { transportOptions } from "./transport";

/** Thrown when trying again can't help: the server refuses the address or the message for good. */
export class FinalMailError extends Error {
  override name = "FinalMailError";
}

let known: Transporter | undefined;

const transport = (): Transporter => (known ??= createTransport(transportOptions(env().SMTP_URL)));

export type Outgoing = { to: string; messageId: string; subject: string; html: string; text: string };

// RFC 5321 4.1.2, dot-string at domain: no quoted parts, comments, groups or lists, which programs on the way read differently.
const PLAIN_ADDRESS = /^[A-Za-z0-9.!#$%&'*+/=?^_`{|}~-]{1,64}@[A-Za-z0-9](?:[A-Za-z0-9.-]{0,188}[A-Za-z0-9])?$/;

/** What the server said to the address or to the message. Anything else that it refuses, such as our password, is no fault of this one. */
const ABOUT_THIS_ONE = new Set(["RCPT TO", "DATA"]);

function isFinal(cause: unknown): boolean {
  if (!(cause instanceof Error) || !("responseCode" in cause) || !("command" in cause)) return false;
  const code = Number(cause.responseCode);
  return code >= 500 && code < 600 && ABOUT_THIS_ONE.has(String(cause.command));
}

/** Hands one message to the mail server; the envelope holds exactly the stored address. */
export async function sendMail({ to, messageId, subject, html, text }: Outgoing): Promise<void> {
  if (!PLAIN_ADDRESS.test(to)) throw new FinalMailError("not an address that can be written to");
  const from = /^(.*?)\s*<([^<>]+)>$/.exec(env().MAIL_FROM);
  const sender = from ? { name: from[1] ?? "", address: from[2] ?? "" } : { name: "", address: env().MAIL_FROM };
  try {
    await transport().sendMail({ from: sender, to: { name: "", address: to }, envelope: { from: sender.address, to: [to] }, messageId, subject, html, text, headers: { "auto-submitted": "auto-generated" } });
  } catch (cause) {
    if (isFinal(cause)) throw new FinalMailError(cause instanceof Error ? cause.message : "refused", { cause });
    throw cause;
  }
}
