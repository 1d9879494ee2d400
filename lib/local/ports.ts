import { createServer } from "node:net";
import { Refused } from "./refused";

/** One port for each part that listens, all on the loopback address. */
export type Ports = { app: number; database: number; mail: number; mailPage: number; payments: number; uploads: number };

/** Where `npm start` listens. */
export const START_PORTS: Ports = { app: 3000, database: 33307, mail: 3025, mailPage: 3026, payments: 3027, uploads: 3028 };

/** Where the tests listen, so that they can run beside a started copy. */
export const TEST_PORTS: Ports = { app: 4000, database: 44307, mail: 4025, mailPage: 4026, payments: 4027, uploads: 4028 };

/** Answers of a machine without the newer kind of address. */
const NO_SUCH_ADDRESS = ["EADDRNOTAVAIL", "EAFNOSUPPORT"];
const HIGHEST_BASE = 65_000;

/** The ports to use: the usual ones, or six counted from TOWFOLIO_PORT_BASE, for a machine where the usual ones are taken. */
export function portsFrom(usual: Ports, base: string | undefined): Ports {
  if (base === undefined || base === "") return usual;
  const first = Number(base);
  if (!Number.isInteger(first) || first < 1024 || first > HIGHEST_BASE) {
    throw new Refused(`TOWFOLIO_PORT_BASE is "${base}", which is not a whole number from 1024 to ${HIGHEST_BASE}.`);
  }
  return { app: first, database: first + 7, mail: first + 25, mailPage: first + 26, payments: first + 27, uploads: first + 28 };
}

/** Refuses, naming the port, when something else listens on it. */
export async function requireFreePort(port: number, purpose: string): Promise<void> {
  // "localhost" means either address, and a browser may try the other one first.
  const fault = (await listenFault(port, "127.0.0.1")) ?? (await listenFault(port, "::1"));
  if (fault === "EADDRINUSE") {
    throw new Refused(`Port ${port}, wanted for ${purpose}, is taken by another program. Stop that program, or set TOWFOLIO_PORT_BASE to another range, such as 5000.`);
  }
  if (fault !== null) throw new Refused(`Port ${port}, wanted for ${purpose}, cannot be used (${fault}).`);
}

function listenFault(port: number, host: string): Promise<string | null> {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once("error", ({ code, message }: NodeJS.ErrnoException) => resolve(code && NO_SUCH_ADDRESS.includes(code) ? null : (code ?? message)));
    probe.listen({ port, host, exclusive: true }, () => probe.close(() => resolve(null)));
  });
}
