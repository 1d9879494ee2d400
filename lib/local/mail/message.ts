import { type AddressObject, simpleParser } from "mailparser";

/** A message as the sink keeps it; the raw source lies beside it. */
export type Message = {
  id: string;
  receivedAt: string;
  /** What the sending side said on the wire, which may differ from the headers. */
  envelope: { from: string; to: string[] };
  messageId: string | null;
  subject: string;
  from: string;
  to: string;
  cc: string;
  replyTo: string;
  text: string;
  html: string | null;
  attachments: { filename: string; contentType: string; size: number }[];
  size: number;
};

/** Reads the parts of a message that the pages and the tests ask for. */
export async function readMessage(id: string, raw: Buffer, envelope: Message["envelope"]): Promise<Message> {
  const mail = await simpleParser(raw);
  return {
    id,
    receivedAt: new Date().toISOString(),
    envelope,
    messageId: mail.messageId ?? null,
    subject: mail.subject ?? "",
    from: addresses(mail.from),
    to: addresses(mail.to),
    cc: addresses(mail.cc),
    replyTo: addresses(mail.replyTo),
    text: mail.text ?? "",
    html: typeof mail.html === "string" ? mail.html : null,
    attachments: mail.attachments.map((one) => ({ filename: one.filename ?? "unnamed", contentType: one.contentType, size: one.size })),
    size: raw.length,
  };
}

/** The bytes of one attachment, counted from 0. */
export async function readAttachment(raw: Buffer, index: number) {
  return (await simpleParser(raw)).attachments[index];
}

/** Messages to one address when the text holds an @, else those with a recipient that contains it. */
export function sentTo(messages: readonly Message[], to: string): Message[] {
  const wanted = to.trim().toLowerCase();
  if (!wanted) return [...messages];
  const fits = (address: string) => (wanted.includes("@") ? address.toLowerCase() === wanted : address.toLowerCase().includes(wanted));
  return messages.filter((message) => message.envelope.to.some(fits));
}

const addresses = (value: AddressObject | AddressObject[] | undefined) =>
  (Array.isArray(value) ? value : value ? [value] : []).map((one) => one.text).join(", ");
