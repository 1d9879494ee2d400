import { openFaults } from "../faults";
import { type Exchange, listen, Refusal, type Running, sendJson } from "../http";
import { type Mailbox, openMailbox } from "./mailbox";
import { readAttachment, sentTo } from "./message";
import { sendList, sendMessage, sendMissing } from "./pages";
import { listenSmtp, MAIL_FAULTS } from "./smtp";

/** The running sink; `port` and `url` are those of the page. */
export type MailSink = Running & { smtpPort: number; smtpUrl: string };

/**
 * The mail stand-in: takes every message over SMTP, keeps it under the folder and shows it on a page.
 * It passes nothing on.
 */
export async function startMailSink(options: { smtpPort: number; pagePort: number; folder: string }): Promise<MailSink> {
  const mailbox = openMailbox(options.folder);
  const faults = openFaults(MAIL_FAULTS);
  const smtp = await listenSmtp(options.smtpPort, mailbox, faults);
  const page = await listen(options.pagePort, async (exchange) => {
    if (!(await faults.serve(exchange))) await route(exchange, mailbox);
  }).catch(async (error: unknown) => {
    await smtp.close();
    throw error;
  });
  return {
    url: page.url,
    port: page.port,
    smtpPort: smtp.port,
    smtpUrl: `smtp://127.0.0.1:${smtp.port}`,
    close: async () => void (await Promise.all([smtp.close(), page.close()])),
  };
}

async function route({ request, response, url }: Exchange, mailbox: Mailbox): Promise<void> {
  const to = url.searchParams.get("to") ?? "";
  const [first, id = "", part, index] = url.pathname.split("/").slice(1);
  if (request.method === "DELETE" && url.pathname === "/messages") {
    mailbox.clear();
    return sendJson(response, 200, { cleared: true });
  }
  if (request.method !== "GET" && request.method !== "HEAD") throw new Refusal(405, "GET, or DELETE /messages.");
  if (url.pathname === "/") return sendList(response, sentTo(mailbox.all(), to), to);
  if (url.pathname === "/messages") return sendJson(response, 200, sentTo(mailbox.all(), to));
  const message = mailbox.get(id);
  if (first === "m" && part === undefined) return message ? sendMessage(response, message) : sendMissing(response);
  if (first !== "messages" || !message) throw new Refusal(404, "No such message.");
  if (part === undefined) return sendJson(response, 200, message);
  const raw = mailbox.raw(id);
  if (!raw) throw new Refusal(404, "No such message.");
  if (part === "raw") return sendFile(response, raw, "text/plain; charset=utf-8", "inline");
  const attachment = part === "attachments" ? await readAttachment(raw, Number(index)) : undefined;
  if (!attachment) throw new Refusal(404, "No such attachment.");
  const name = encodeURIComponent(attachment.filename ?? "unnamed");
  sendFile(response, attachment.content, attachment.contentType, `attachment; filename*=UTF-8''${name}`);
}

function sendFile(response: Exchange["response"], content: Buffer, type: string, disposition: string): void {
  response.writeHead(200, {
    "content-type": type,
    "content-disposition": disposition,
    "content-length": content.length,
    "x-content-type-options": "nosniff",
    "content-security-policy": "sandbox",
  });
  response.end(content);
}
