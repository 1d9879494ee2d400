import type { AddressInfo } from "node:net";
import { SMTPServer, type SMTPServerDataStream, type SMTPServerSession } from "smtp-server";
import type { Faults } from "../faults";
import { pause } from "../http";
import type { Mailbox } from "./mailbox";

/** What the sink can do wrong on order. */
export const MAIL_FAULTS = ["refuse", "reject", "slow", "drop-after-data", "late-answer"] as const;

const LARGEST_MESSAGE_BYTES = 25 * 1024 * 1024;
const SLOW_MS = 60_000;

class SmtpRefusal extends Error {
  constructor(readonly responseCode: number, message: string) {
    super(message);
  }
}

/** Takes mail over SMTP on the loopback address. No TLS and no sign-in: there is nobody in between. */
export async function listenSmtp(port: number, mailbox: Mailbox, faults: Faults) {
  const server = new SMTPServer({
    banner: "stand-in, nothing leaves this machine",
    disabledCommands: ["AUTH", "STARTTLS"],
    disableReverseLookup: true,
    size: LARGEST_MESSAGE_BYTES,
    closeTimeout: 100,
    onConnect: (_session, done) => done(refuseConnection(faults)),
    onRcptTo: (address, _session, done) => void judgeRecipient(faults, address.address).then(done, done),
    onData: (stream, session, done) => {
      take(stream, session, mailbox).then(
        async () => {
          await late(faults, session);
          return takesAnswer(faults, session) ? done() : dropConnection(server, session);
        },
        (error: unknown) => done(error instanceof Error ? error : new Error(String(error))),
      );
    },
  });
  // A client that hangs up in the middle is its own affair and must not end the stand-in.
  await new Promise<void>((resolve, reject) => {
    server.once("error", reject);
    server.listen(port, "127.0.0.1", () => resolve());
  });
  server.on("error", () => {});
  const close = () => new Promise<void>((resolve) => server.close(() => resolve()));
  return { port: (server.server.address() as AddressInfo).port, close };
}

/** Without an address a refusal meets everyone, before they can say whom they write to. */
function refuseConnection(faults: Faults): SmtpRefusal | null {
  return faults.take("refuse", (fault) => fault.to === undefined) ? new SmtpRefusal(421, "Service not available, try again later") : null;
}

async function judgeRecipient(faults: Faults, address: string): Promise<SmtpRefusal | undefined> {
  const meant = (fault: { to: string | undefined }) => fault.to === address.toLowerCase();
  const meantOrAll = (fault: { to: string | undefined }) => fault.to === undefined || meant(fault);
  const slow = faults.take("slow", meantOrAll);
  if (slow) await pause(slow.ms ?? SLOW_MS);
  if (faults.take("refuse", meant)) return new SmtpRefusal(450, "Mailbox unavailable, try again later");
  if (faults.take("reject", meantOrAll)) return new SmtpRefusal(550, "No such mailbox here");
  return undefined;
}

async function take(stream: SMTPServerDataStream, session: SMTPServerSession, mailbox: Mailbox): Promise<void> {
  const chunks: Buffer[] = [];
  for await (const chunk of stream as AsyncIterable<Buffer>) {
    // The rest is still read, else the client never gets to hear the answer.
    if (!stream.sizeExceeded) chunks.push(chunk);
  }
  if (stream.sizeExceeded) throw new SmtpRefusal(552, "Message exceeds fixed maximum message size");
  const { mailFrom, rcptTo } = session.envelope;
  await mailbox.keep(Buffer.concat(chunks), { from: mailFrom ? mailFrom.address : "", to: rcptTo.map((one) => one.address) });
}

const isAmongRecipients = (session: SMTPServerSession) => (fault: { to: string | undefined }) =>
  fault.to === undefined || session.envelope.rcptTo.some((one) => one.address.toLowerCase() === fault.to);

/** The message lies here, but the sender waits to hear so. */
async function late(faults: Faults, session: SMTPServerSession): Promise<void> {
  const fault = faults.take("late-answer", isAmongRecipients(session));
  if (fault) await pause(fault.ms ?? SLOW_MS);
}

/** False when the sender must not hear that its message was taken. */
const takesAnswer = (faults: Faults, session: SMTPServerSession): boolean => !faults.take("drop-after-data", isAmongRecipients(session));

function dropConnection(server: SMTPServer, session: SMTPServerSession): void {
  for (const connection of server.connections) if (connection.session.id === session.id) connection._socket.destroy();
}
