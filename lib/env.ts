import { z } from "zod";

const url = (what: string) => z.url({ error: `${what} must be an address such as https://…` });
const secret = z.string().min(32, "must be at least 32 characters; make one with: openssl rand -base64 33");

const schema = z.object({
  NODE_ENV: z.enum(["development", "test", "production"]).default("production"),
  APP_URL: url("APP_URL").transform((text) => text.replace(/\/+$/, "")),
  DATABASE_URL: z.string().regex(/^mysql:\/\//, "must begin with mysql://"),
  DATABASE_POOL: z.coerce.number().int().min(1).max(200).default(10),
  AUTH_SECRET: secret,
  SMTP_URL: z.string().regex(/^smtps?:\/\//, "must begin with smtp:// or smtps://"),
  MAIL_FROM: z.string().min(3, "must name who the mail is from, such as Towfolio <cases@example.org>"),
  UPLOADTHING_TOKEN: z.string().min(20, "must be the token of the file service"),
  UPLOADTHING_INGEST_URL: z.url().optional(),
  UPLOADTHING_API_URL: z.url().optional(),
  UPLOADTHING_UFS_HOST: z.string().optional(),
  UPLOADTHING_UFS_APP_ID_LOCATION: z.enum(["path", "subdomain"]).optional(),
  UPLOADTHING_CALLBACK_URL: z.url().optional(),
  STRIPE_SECRET_KEY: z.string().regex(/^(sk|rk)_/, "must be a secret key that begins with sk_ or rk_"),
  STRIPE_WEBHOOK_SECRET: z.string().regex(/^whsec_/, "must begin with whsec_"),
  STRIPE_API_BASE: z.url().optional(),
  /** Header that only the proxy in front writes; without it the connection's own address counts. */
  TRUSTED_PROXY_HEADER: z.string().regex(/^[a-z0-9-]+$/i).optional(),
});

export type Env = z.output<typeof schema>;

const KNOWN_DEFAULTS = /^(change-?me|secret|password|sample|default)/i;

const isLoopback = (address: string) => /^(localhost|127\.0\.0\.1|\[::1\])$/.test(new URL(address).hostname);

/** Faults that no single variable shows by itself. */
function unsafe(env: Env): string[] {
  const faults: string[] = [];
  if (KNOWN_DEFAULTS.test(env.AUTH_SECRET)) faults.push("AUTH_SECRET: is a known default, not a secret");
  if (!env.APP_URL.startsWith("https://") && !isLoopback(env.APP_URL)) faults.push("APP_URL: must be https:// except on this machine itself");
  if (env.STRIPE_API_BASE && !isLoopback(env.STRIPE_API_BASE)) faults.push("STRIPE_API_BASE: may only point at this machine (a local stand-in)");
  return faults;
}

/** Reads the environment as a whole: either usable, or every fault at once. */
export function readEnv(source: Record<string, string | undefined>): { env: Env; faults: null } | { env: null; faults: string[] } {
  const parsed = schema.safeParse(source);
  if (!parsed.success) {
    return { env: null, faults: parsed.error.issues.map((issue) => `${issue.path.join(".")}: ${source[String(issue.path[0])] === undefined ? "is missing" : issue.message}`) };
  }
  const faults = unsafe(parsed.data);
  return faults.length > 0 ? { env: null, faults } : { env: parsed.data, faults: null };
}

let known: Env | undefined;

/** The environment, read at first use, so that a build needs none of it. */
export function env(): Env {
  if (known) return known;
  const read = readEnv(process.env);
  if (read.env === null) throw new Error(`The environment is not usable:\n${read.faults.map((fault) => `  ${fault}`).join("\n")}`);
  return (known = read.env);
}
