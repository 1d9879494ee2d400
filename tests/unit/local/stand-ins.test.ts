import { createServer } from "node:net";
import type { AddressInfo } from "node:net";
import { createTransport } from "nodemailer";
import { UTApi } from "uploadthing/server";
import { describe, expect, it } from "vitest";
import { startStandIns, type StandInOptions } from "../../../lib/local/stand-ins";
import { aClient } from "./payments-app";
import { aFolder, afterTest } from "./support";

const anyPorts = { mail: 0, mailPage: 0, payments: 0, uploads: 0 };
const keys = { paymentsSecretKey: "sk_test_1", paymentsWebhookSecret: "whsec_1", uploadsApiKey: "sk_live_1", uploadsAppId: "sample" };

async function start(changes: Partial<StandInOptions> = {}) {
  const standIns = await startStandIns({ folder: aFolder(), ports: anyPorts, appUrl: "http://localhost:3000", keys, ...changes });
  afterTest(() => standIns.stop());
  return standIns;
}

describe("the stand-ins together", () => {
  it("answer at what the environment names", async () => {
    const { env, urls } = await start();
    const transport = createTransport(env.SMTP_URL);
    await transport.sendMail({ from: "a@example.test", to: "b@example.test", subject: "Hello", text: "Hello" });
    expect(await (await fetch(`${urls.mail}/messages`)).json()).toHaveLength(1);
    expect((await aClient(Number(new URL(env.STRIPE_API_BASE ?? "").port), {}, env.STRIPE_SECRET_KEY).events.list()).data).toEqual([]);
    const uploads = new UTApi({ token: env.UPLOADTHING_TOKEN ?? "", apiUrl: env.UPLOADTHING_API_URL ?? "", logLevel: "None" });
    expect((await uploads.listFiles()).files).toEqual([]);
    expect(env).toMatchObject({
      UPLOADTHING_UFS_APP_ID_LOCATION: "path",
      UPLOADTHING_CALLBACK_URL: "http://localhost:3000/api/uploadthing",
      UPLOADTHING_UFS_HOST: new URL(urls.uploads ?? "").host,
      STRIPE_WEBHOOK_SECRET: "whsec_1",
    });
  });

  it("start only where asked, and leave the environment of the others alone", async () => {
    const { env, urls } = await start({ only: ["mail"] });
    expect([Object.keys(env), Object.keys(urls)]).toEqual([["SMTP_URL"], ["mail"]]);
  });

  it("serve only the machine's own names", async () => {
    const { urls } = await start({ only: ["mail"] });
    const { request } = await import("node:http");
    const status = await new Promise((resolve) => request(urls.mail ?? "", { headers: { host: "elsewhere.example" } }, (answer) => resolve(answer.statusCode)).end());
    expect(status).toBe(421);
  });

  it("stop again when one of them finds its port taken", async () => {
    const other = createServer();
    await new Promise<void>((resolve) => other.listen(0, "127.0.0.1", resolve));
    afterTest(() => other.close());
    const { port } = other.address() as AddressInfo;
    await expect(start({ ports: { ...anyPorts, uploads: port } })).rejects.toThrow("EADDRINUSE");
  });
});
