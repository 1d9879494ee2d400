import { afterAll, beforeEach, expect, it } from "vitest";
import { renderMail } from "@/lib/mail/render";
import { FinalMailError, sendMail } from "@/lib/mail/send";
import { TEST_ENVIRONMENT } from "../../support/environment";
import { openSink } from "../outbox/post";

const sink = await openSink();
Object.assign(process.env, TEST_ENVIRONMENT, { DATABASE_URL: "mysql://nobody@127.0.0.1/none", SMTP_URL: sink.smtpUrl });
afterAll(() => sink.close());
beforeEach(() => sink.clear());

const aLetter = (given: Partial<Parameters<typeof sendMail>[0]> = {}) => ({ to: "a@example.test", messageId: "<one@example.test>", subject: "Hello", html: "<p>Hello</p>", text: "Hello", ...given });

/** Every line before the empty one that ends the headers. */
const headersOf = (source: string) => source.slice(0, source.indexOf("\r\n\r\n")).replaceAll(/\r\n[ \t]+/g, " ").split("\r\n");

it.each([
  "a@example.test, b@example.test",
  "a@example.test;b@example.test",
  "a@example.test b@example.test",
  "a@example.test>, <b@example.test",
  "a@example.test> RCPT TO:<b@example.test",
  "a@example.test\r\nRCPT TO:<b@example.test>",
  "a@example.test\nBcc: b@example.test",
  "a@example.test\r\n\r\nHello",
  "a@example.test\0b@example.test",
  "a@example.test(b@example.test)",
  "a(b@example.test)@example.test",
  "Name <a@example.test>",
  "<a@example.test>",
  "team: a@example.test, b@example.test;",
  '"a b"@example.test',
  '"a@example.test> <b"@example.test',
  "a@b@example.test",
  "@relay.example.test:a@example.test",
  "a%b@example.test@relay.example.test",
  "a@[127.0.0.1]",
  "a@",
  "@example.test",
  "a",
  "",
  " a@example.test",
  "a@example.test ",
  "a\u2028@example.test",
  "ａ@example.test",
  "jos\u00e9@example.test",
  "a@ex\u00e4mple.test",
  "a@example.test\u202eb",
  `${"a".repeat(65)}@example.test`,
  `a@${"b".repeat(250)}.test`,
])("%j is refused before a server is asked", async (to) => {
  await expect(sendMail(aLetter({ to }))).rejects.toThrow(FinalMailError);
  expect(await sink.messages()).toEqual([]);
});

it.each(["a@example.test", "a.b+case-7@mail.example.test", "o'brien@example.test", "a=b@example.test", "MiXed@example.test", `${"a".repeat(64)}@example.test`])("%s is written to as it is, and nobody else", async (to) => {
  await sendMail(aLetter({ to }));
  const [arrived, ...others] = await sink.messages();
  expect(others).toEqual([]);
  expect(arrived?.envelope).toEqual({ from: "cases@example.test", to: [to] });
  expect(arrived?.to).toBe(to);
});

it.each([
  "Hello\r\nBcc: b@example.test",
  "Hello\nX-Other: yes",
  "Hello\r\n\r\n<script>",
  "Hello\u0000\u001b[31m there",
  "Hello\u2028Bcc: b@example.test",
  "=?utf-8?q?Hello=0D=0ABcc:_b@example.test?=",
  "Ä 🚂 ".repeat(60),
])("the subject %j makes one header line and no recipient", async (headline) => {
  const news = { unit: "ZVRX 2783", caseNumber: "99-1", headline, lines: [headline], actionLabel: "Look", url: "http://localhost:4999/" };
  await sendMail(aLetter({ ...(await renderMail("finding-posted", news)) }));
  const [arrived, ...others] = await sink.messages();
  expect(others).toEqual([]);
  expect(arrived?.envelope.to).toEqual(["a@example.test"]);
  expect(arrived?.cc).toBe("");
  expect(arrived?.subject).not.toMatch(/[\r\n\0]/);
  const names = headersOf(await sink.source()).map((header) => header.split(":")[0]?.toLowerCase());
  expect(names.filter((name) => name === "subject")).toHaveLength(1);
  expect(names).not.toContain("bcc");
  expect(names).not.toContain("x-other");
});

it("what a person typed is text in the message, not markup", async () => {
  const typed = `<img src=x onerror=alert(1)><a href="javascript:alert(1)">x</a>`;
  const news = { unit: typed, caseNumber: "99-1", headline: typed, lines: [typed], actionLabel: "Look", url: "http://localhost:4999/" };
  const { html } = await renderMail("finding-posted", news);
  expect(html).not.toMatch(/<img|<a href="javascript/);
  expect(html).toContain("&lt;img");
});

it("says that nobody wrote it, and carries the given Message-ID", async () => {
  await sendMail(aLetter());
  const headers = headersOf(await sink.source()).map((header) => header.toLowerCase());
  expect(headers).toContain("auto-submitted: auto-generated");
  expect(headers).toContain("message-id: <one@example.test>");
});

it("what the server says to the address or the message is final from 500 on; the rest is tried again", async () => {
  await sink.fault({ kind: "reject", times: 1 });
  await expect(sendMail(aLetter())).rejects.toThrow(FinalMailError);
  for (const fault of [{ kind: "refuse", times: 1 }, { kind: "refuse", times: 1, to: "a@example.test" }, { kind: "drop-after-data", times: 1 }]) {
    await sink.fault(fault);
    const error = await sendMail(aLetter()).catch((caught: unknown) => caught);
    expect(error).toBeInstanceOf(Error);
    expect(error).not.toBeInstanceOf(FinalMailError);
  }
});
