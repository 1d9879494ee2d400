import type { ServerResponse } from "node:http";
import { escape, sendPage } from "../page";
import type { Message } from "./message";

const NOTE = "This is the mail stand-in on this machine. Messages that would be e-mailed end up here; nothing leaves the machine.";

/** The list, newest first. */
export function sendList(response: ServerResponse, messages: readonly Message[], to: string): void {
  const rows = messages.map(row).join("\n");
  const empty = to
    ? `<p>No message went to “${escape(to)}”. <a href="/">Show all</a></p>`
    : "<p>No messages yet. What the product sends appears here.</p>";
  const body = `<h1>Sent mail</h1>
<form class="line" method="get" action="/"><label>Recipient<input name="to" type="search" value="${escape(to)}" autocomplete="off"></label>
<button>Show</button></form>
<p class="hint">${messages.length} ${messages.length === 1 ? "message" : "messages"}, newest first. <a href="${escape(to ? `/?to=${encodeURIComponent(to)}` : "/")}">Look again</a></p>
<div class="sheet">${rows || empty}</div>`;
  sendPage(response, { title: "Sent mail", note: NOTE, body });
}

const row = (message: Message) =>
  `<a class="row" href="/m/${message.id}"><strong>${escape(message.subject || "(no subject)")}</strong>
<small>to ${escape(message.envelope.to.join(", "))} · ${time(message)}</small></a>`;

/** One message: its facts, its text with links, and its HTML shut into a frame. */
export function sendMessage(response: ServerResponse, message: Message): void {
  const facts: [string, string][] = [
    ["From", message.from],
    ["To", message.to],
    ["Copy to", message.cc],
    ["Reply to", message.replyTo],
    ["Delivered to", message.envelope.to.join(", ")],
    ["Sender on the wire", message.envelope.from || "(none)"],
    ["Message-ID", message.messageId ?? "(none)"],
  ];
  const list = facts.filter(([, value]) => value).map(([name, value]) => `<dt>${name}</dt><dd>${escape(value)}</dd>`);
  const body = `<p><a href="/">All mail</a></p><h1>${escape(message.subject || "(no subject)")}</h1>
<div class="sheet"><dl>${list.join("")}<dt>Received</dt><dd>${time(message)}</dd></dl>${attachments(message)}</div>
${message.text ? `<div class="sheet"><h2 class="hint">Text</h2><pre>${withLinks(message.text)}</pre></div>` : ""}
${message.html === null ? "" : frame(message.html)}
<p><a href="/messages/${message.id}/raw">Source of the message</a> (${message.size.toLocaleString("en-US")} bytes)</p>`;
  sendPage(response, { title: message.subject || "(no subject)", note: NOTE, body });
}

/** Says that there is no such message. */
export function sendMissing(response: ServerResponse): void {
  const body = `<h1>No such message</h1><p>It may have been cleared away. <a href="/">All mail</a></p>`;
  sendPage(response, { status: 404, title: "No such message", note: NOTE, body });
}

// No scripts and no origin inside the frame; links open beside it, because most pages refuse to be framed.
const frame = (html: string) =>
  `<div class="sheet"><h2 class="hint">As a mail program shows it</h2>
<iframe title="The message as HTML" sandbox="allow-popups allow-popups-to-escape-sandbox" referrerpolicy="no-referrer" srcdoc="${escape(`<base target="_blank">${html}`)}"></iframe></div>`;

const attachments = (message: Message) =>
  message.attachments
    .map((one, index) => `<p>Attached: <a href="/messages/${message.id}/attachments/${index}">${escape(one.filename)}</a> <small>${escape(one.contentType)}, ${one.size.toLocaleString("en-US")} bytes</small></p>`)
    .join("");

const time = (message: Message) => `<time datetime="${message.receivedAt}">${message.receivedAt.slice(0, 19).replace("T", " ")} UTC</time>`;

/** Escapes text and makes the web addresses in it into links; a full stop that ends the sentence stays outside. */
export function withLinks(text: string): string {
  return text
    .split(/(https?:\/\/[^\s<>"]+[^\s<>".,;:!?)\]}'])/)
    .map((part, index) => (index % 2 ? `<a href="${escape(part)}" target="_blank" rel="noreferrer">${escape(part)}</a>` : escape(part)))
    .join("");
}
