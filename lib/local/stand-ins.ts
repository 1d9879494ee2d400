import { join } from "node:path";
import type { Hosted } from "./environment";
import type { Running } from "./http";
import type { Keys } from "./keys";
import { startMailSink } from "./mail/sink";
import { startPaymentService } from "./payments/service";
import type { Ports } from "./ports";
import { startUploadService } from "./uploads/service";

export type StandInOptions = {
  /** Each stand-in keeps its things in a folder of its own below this one. */
  folder: string;
  ports: Pick<Ports, "mail" | "mailPage" | "payments" | "uploads">;
  /** Where webhooks and callbacks go. */
  appUrl: string;
  keys: Pick<Keys, "paymentsSecretKey" | "paymentsWebhookSecret" | "uploadsApiKey" | "uploadsAppId">;
  /** All of them when left out. */
  only?: readonly Hosted[];
};

/** The stand-ins that run, where their pages are, and the environment that makes the product use them. */
export type StandIns = { urls: Partial<Record<Hosted, string>>; env: Record<string, string>; stop(): Promise<void> };

type Started = { service: Running; env: Record<string, string> };

const STARTERS: Record<Hosted, (options: StandInOptions, folder: string) => Promise<Started>> = {
  async mail({ ports }, folder) {
    const service = await startMailSink({ smtpPort: ports.mail, pagePort: ports.mailPage, folder });
    return { service, env: { SMTP_URL: service.smtpUrl } };
  },
  async payments({ ports, keys, appUrl }, folder) {
    const { paymentsSecretKey: secretKey, paymentsWebhookSecret: webhookSecret } = keys;
    const service = await startPaymentService({ port: ports.payments, folder, secretKey, webhookSecret, webhookUrl: `${appUrl}/api/stripe/webhook` });
    return { service, env: { STRIPE_API_BASE: service.url, STRIPE_SECRET_KEY: secretKey, STRIPE_WEBHOOK_SECRET: webhookSecret } };
  },
  async uploads({ ports, keys, appUrl }, folder) {
    const said = { apiKey: keys.uploadsApiKey, appId: keys.uploadsAppId, regions: ["local"] };
    const token = Buffer.from(JSON.stringify(said)).toString("base64");
    const service = await startUploadService({ port: ports.uploads, folder, token });
    const env = {
      UPLOADTHING_TOKEN: token,
      UPLOADTHING_INGEST_URL: service.url,
      UPLOADTHING_API_URL: service.url,
      UPLOADTHING_UFS_HOST: new URL(service.url).host,
      UPLOADTHING_UFS_APP_ID_LOCATION: "path",
      UPLOADTHING_CALLBACK_URL: `${appUrl}/api/uploadthing`,
    };
    return { service, env };
  },
};

/** Starts the stand-ins that are asked for; when one cannot start, those before it are stopped again. */
export async function startStandIns(options: StandInOptions): Promise<StandIns> {
  const names = (Object.keys(STARTERS) as Hosted[]).filter((name) => !options.only || options.only.includes(name));
  const started: [Hosted, Started][] = [];
  const stop = async () => void (await Promise.all(started.map(([, { service }]) => service.close())));
  try {
    for (const name of names) started.push([name, await STARTERS[name](options, join(options.folder, name))]);
  } catch (error) {
    await stop();
    throw error;
  }
  return {
    urls: Object.fromEntries(started.map(([name, { service }]) => [name, service.url])),
    env: Object.assign({}, ...started.map(([, { env }]) => env)) as Record<string, string>,
    stop,
  };
}
