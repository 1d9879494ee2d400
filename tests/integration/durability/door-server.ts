// First, since it readies what `headers()` of the web server stands on.
import { ask } from "../../support/asking";
import { createServer, type IncomingMessage, type ServerResponse } from "node:http";
import { z } from "zod";
import { idOf } from "@/lib/access/input";
import { command } from "@/lib/entry/command";
import { take } from "./writers";

const die = (moment: string) => {
  if (process.env.DIE === moment) process.kill(process.pid, "SIGKILL");
};

const door = command(z.strictObject({ moveId: idOf, writer: z.number(), seq: z.number() }), async (viewer, step, attempt) => {
  const answer = await take(viewer, step, attempt, () => void die("before the commit"));
  die("before the answer");
  return answer;
});

async function serve(incoming: IncomingMessage, outgoing: ServerResponse): Promise<void> {
  const chunks: Buffer[] = [];
  for await (const chunk of incoming as AsyncIterable<Buffer>) chunks.push(chunk);
  const headers = Object.entries(incoming.headers).flatMap(([name, value]): [string, string][] => (typeof value === "string" ? [[name, value]] : []));
  const answer = await ask(door, new Request(`${process.env.APP_URL}${incoming.url}`, { method: "POST", headers, body: Buffer.concat(chunks) }));
  outgoing.writeHead(answer.status, { "content-type": "application/json", connection: "close" }).end(Buffer.from(await answer.arrayBuffer()));
}

/** One of our doors behind a plain web server of its own process, which may be killed. */
createServer((incoming, outgoing) => void serve(incoming, outgoing)).listen(Number(process.env.PORT), "127.0.0.1");
