import { createTransport } from "nodemailer";
import { describe, expect, it } from "vitest";
import { withLinks } from "../../../lib/local/mail/pages";
import type { Message } from "../../../lib/local/mail/message";
import { type MailSink, startMailSink } from "../../../lib/local/mail/sink";
import { aFolder, afterTest, postJson, running, until } from "./support";

const start = (folder = aFolder()) => running(startMailSink({ smtpPort: 0, pagePort: 0, folder }));

function sender(sink: MailSink, extra: object = {}) {
  const transport = createTransport({ host: "127.0.0.1", port: sink.smtpPort, secure: false, ...extra });
  afterTest(() => transport.close());
  return transport;
}

const aLetter = {
  from: "Yard office <yard@example.test>",
  to: "Mae Alder <mae@example.test>",
  subject: "ZVRX 2783 is ready",
  text: "Open it: https://example.test/join/abc?x=1&y=2. Thank you.",
  html: '<p>Open <a href="https://example.test/join/abc">it</a></p><script>document.title="ran"</script>',
  messageId: "<fixed-1@example.test>",
};

const listed = async (sink: MailSink, to = ""): Promise<Message[]> => (await fetch(`${sink.url}/messages?to=${encodeURIComponent(to)}`)).json();

describe("what it keeps", () => {
  it("keeps envelope, Message-ID, parts and source", async () => {
    const sink = await start();
    await sender(sink).sendMail({ ...aLetter, bcc: "quiet@example.test", attachments: [{ filename: "card.txt", content: "tow card" }] });
    const [message] = await listed(sink);
    expect(message?.envelope).toEqual({ from: "yard@example.test", to: ["mae@example.test", "quiet@example.test"] });
    expect(message?.messageId).toBe("<fixed-1@example.test>");
    expect(message?.text).toContain("https://example.test/join/abc?x=1&y=2");
    expect(message?.attachments).toEqual([{ filename: "card.txt", contentType: "text/plain", size: 8 }]);
    const raw = await (await fetch(`${sink.url}/messages/${message?.id}/raw`)).text();
    expect(raw).toContain("Message-ID: <fixed-1@example.test>");
    expect(await (await fetch(`${sink.url}/messages/${message?.id}/attachments/0`)).text()).toBe("tow card");
  });

  it("still has the mail after a restart", async () => {
    const folder = aFolder();
    const first = await startMailSink({ smtpPort: 0, pagePort: 0, folder });
    await sender(first).sendMail(aLetter);
    await first.close();
    const second = await start(folder);
    const [message] = await listed(second);
    expect(message?.subject).toBe("ZVRX 2783 is ready");
    expect((await fetch(`${second.url}/messages/${message?.id}/raw`)).status).toBe(200);
  });

  it("lists newest first, filters by recipient and clears", async () => {
    const sink = await start();
    for (const to of ["a@example.test", "aa@example.test", "A@example.test"]) await sender(sink).sendMail({ ...aLetter, to, subject: to });
    expect((await listed(sink)).map((one) => one.subject)).toEqual(["A@example.test", "aa@example.test", "a@example.test"]);
    expect((await listed(sink, "a@example.test")).map((one) => one.subject)).toEqual(["A@example.test", "a@example.test"]);
    expect((await fetch(`${sink.url}/messages`, { method: "DELETE" })).status).toBe(200);
    expect(await listed(sink)).toEqual([]);
  });

  it("offers neither TLS nor sign-in, so that a client which asks for them is told no", async () => {
    const sink = await start();
    await expect(sender(sink, { requireTLS: true }).sendMail(aLetter)).rejects.toThrow();
    expect(await listed(sink)).toEqual([]);
  });

  it("refuses a message above its size with 552", async () => {
    const sink = await start();
    const text = "x".repeat(70).concat("\n").repeat(400_000);
    await expect(sender(sink).sendMail({ ...aLetter, text, html: undefined })).rejects.toMatchObject({ responseCode: 552 });
  });
});

describe("the pages", () => {
  it("say that nothing leaves the machine, link the text and shut the HTML in", async () => {
    const sink = await start();
    await sender(sink).sendMail(aLetter);
    const [message] = await listed(sink);
    const list = await (await fetch(`${sink.url}/?to=mae@example.test`)).text();
    expect(list).toContain("nothing leaves the machine");
    expect(list).toContain("ZVRX 2783 is ready");
    const answer = await fetch(`${sink.url}/m/${message?.id}`);
    const page = await answer.text();
    expect(page).toContain('<a href="https://example.test/join/abc?x=1&amp;y=2"');
    expect(page).toMatch(/<iframe[^>]+sandbox="allow-popups allow-popups-to-escape-sandbox"[^>]+srcdoc="/);
    expect(page).not.toContain("<script>");
    expect(answer.headers.get("content-security-policy")).toContain("default-src 'none'");
  });

  it("leaves the full stop of a sentence out of a link", () => {
    expect(withLinks("see https://example.test/a. Then <b>")).toBe(
      'see <a href="https://example.test/a" target="_blank" rel="noreferrer">https://example.test/a</a>. Then &lt;b&gt;',
    );
  });

  it("answers 404 for what is not there", async () => {
    const sink = await start();
    expect((await fetch(`${sink.url}/m/none`)).status).toBe(404);
    expect((await fetch(`${sink.url}/messages/none`)).status).toBe(404);
  });
});

describe("faults on order", () => {
  it("refuse: 421 for everyone, as often as ordered, then well again", async () => {
    const sink = await start();
    await postJson(`${sink.url}/faults`, { kind: "refuse", times: 2 });
    for (let n = 0; n < 2; n++) await expect(sender(sink).sendMail(aLetter)).rejects.toMatchObject({ responseCode: 421 });
    await sender(sink).sendMail(aLetter);
    expect(await listed(sink)).toHaveLength(1);
  });

  it("refuse and reject for one recipient only", async () => {
    const sink = await start();
    await postJson(`${sink.url}/faults`, { kind: "refuse", to: "full@example.test" });
    await postJson(`${sink.url}/faults`, { kind: "reject", to: "gone@example.test" });
    await expect(sender(sink).sendMail({ ...aLetter, to: "full@example.test" })).rejects.toMatchObject({ responseCode: 450 });
    await expect(sender(sink).sendMail({ ...aLetter, to: "gone@example.test" })).rejects.toMatchObject({ responseCode: 550 });
    await sender(sink).sendMail(aLetter);
    expect(await listed(sink)).toHaveLength(1);
    await postJson(`${sink.url}/faults`, { kind: "off" });
    await sender(sink).sendMail({ ...aLetter, to: "gone@example.test" });
    expect(await listed(sink)).toHaveLength(2);
  });

  it("slow: the sender runs into its own time limit", async () => {
    const sink = await start();
    await postJson(`${sink.url}/faults`, { kind: "slow", ms: 1500, times: 1 });
    await expect(sender(sink, { socketTimeout: 200 }).sendMail(aLetter)).rejects.toThrow(/timeout/i);
  });

  it("drop-after-data: kept, but the sender cannot know; the second try has the same Message-ID", async () => {
    const sink = await start();
    await postJson(`${sink.url}/faults`, { kind: "drop-after-data", times: 1 });
    await expect(sender(sink).sendMail(aLetter)).rejects.toThrow();
    await until(async () => (await listed(sink)).length === 1);
    await sender(sink).sendMail(aLetter);
    expect(new Set((await listed(sink)).map((one) => one.messageId))).toEqual(new Set(["<fixed-1@example.test>"]));
    expect(await listed(sink)).toHaveLength(2);
  });

  it("takes an order only as JSON and only for what it knows", async () => {
    const sink = await start();
    expect((await postJson(`${sink.url}/faults`, { kind: "flood" })).status).toBe(400);
    expect((await postJson(`${sink.url}/faults`, { kind: "slow", ms: -1 })).status).toBe(400);
    expect((await fetch(`${sink.url}/faults`, { method: "POST", body: '{"kind":"slow"}' })).status).toBe(415);
  });
});
