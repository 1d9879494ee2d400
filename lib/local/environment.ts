import { existsSync } from "node:fs";
import { join } from "node:path";
import { databaseUrls } from "./accounts";
import type { Keys } from "./keys";
import type { Ports } from "./ports";
import { Refused } from "./refused";

/** A hosted service that a local stand-in can take the place of. */
export type Hosted = "mail" | "uploads" | "payments";

const HOSTED_KEYS: Record<Hosted, string[]> = {
  mail: ["SMTP_URL"],
  uploads: ["UPLOADTHING_TOKEN"],
  payments: ["STRIPE_SECRET_KEY", "STRIPE_WEBHOOK_SECRET"],
};

/** Reads the file .env beside the program, when there is one; what the shell already set goes first. */
export function readEnvFile(root: string): void {
  const path = join(root, ".env");
  if (existsSync(path)) process.loadEnvFile(path);
}

/** The hosted services whose keys are not given, so that a stand-in has to do. Half of a service's keys is a mistake. */
export function missingServices(given: NodeJS.ProcessEnv): Hosted[] {
  return (Object.keys(HOSTED_KEYS) as Hosted[]).filter((service) => {
    const names = HOSTED_KEYS[service];
    const absent = names.filter((name) => !given[name]);
    if (absent.length > 0 && absent.length < names.length) throw new Refused(`${absent.join(", ")} is missing beside the other keys of ${service}. Give all of them, or none for the local stand-in.`);
    return absent.length > 0;
  });
}

/** Where people reach the site. */
export function appUrlOf(given: NodeJS.ProcessEnv, ports: Ports): string {
  return given.APP_URL ?? `http://localhost:${ports.app}`;
}

/** The environment of the server and the worker of a local copy, on top of what the shell gave. */
export function siteEnvironment(given: NodeJS.ProcessEnv, keys: Keys, ports: Ports, services: Record<string, string>): NodeJS.ProcessEnv {
  return {
    MAIL_FROM: "Towfolio <cases@towfolio.example>",
    AUTH_SECRET: keys.authSecret,
    ...given,
    ...services,
    APP_URL: appUrlOf(given, ports),
    PORT: String(ports.app),
    DATABASE_URL: databaseUrls(keys, ports.database).app,
    NODE_ENV: "production",
    NEXT_TELEMETRY_DISABLED: "1",
  };
}
