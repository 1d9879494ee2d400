import { expect, type Browser, type BrowserContext, type BrowserContextOptions, type Page } from "@playwright/test";

/** Somebody at a browser of their own. */
export type Person = { name: string; email: string; context: BrowserContext; page: Page };

export const DESKTOP = { viewport: { width: 1280, height: 900 } } as const;
export const PHONE = { viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true, deviceScaleFactor: 2 } as const;

const heard = new WeakMap<BrowserContext, string[]>();

/** Notes what a browser complains of on any page of a context: errors of script, of the console, and of the content policy. */
export async function listen(context: BrowserContext): Promise<void> {
  const faults: string[] = [];
  heard.set(context, faults);
  await context.exposeBinding("notePolicyFault", (_source, words: string) => void faults.push(`content policy: ${words}`));
  await context.addInitScript(() => {
    document.addEventListener("securitypolicyviolation", (event) => {
      const note = (window as unknown as { notePolicyFault: (words: string) => Promise<void> }).notePolicyFault;
      void note(`${event.violatedDirective} ${event.blockedURI} on ${location.pathname}`);
    });
  });
  context.on("weberror", (error) => faults.push(`script: ${error.error().message}`));
  context.on("console", (message) => {
    if (message.type() === "error") faults.push(`console: ${message.text()} (${message.location().url})`);
  });
}

/** What a context's browser complained of, but for the answers that a test asks for; forgotten once read. */
export function takeFaults(context: BrowserContext, wanted: readonly RegExp[] = []): string[] {
  const faults = heard.get(context) ?? [];
  return faults.splice(0).filter((fault) => !wanted.some((one) => one.test(fault)));
}

/** A person with a browser of their own, signed in nowhere. */
export async function aPerson(browser: Browser, name: string, email: string, options: BrowserContextOptions = DESKTOP): Promise<Person> {
  const context = await browser.newContext(options);
  await listen(context);
  return { name, email, context, page: await context.newPage() };
}

/** The browsers of these people had nothing to complain of. A refusal that a step asked for is named in `wanted`. */
export function expectQuiet(people: readonly Person[], wanted: readonly RegExp[] = []): void {
  const faults = people.flatMap(({ name, context }) => takeFaults(context, wanted).map((fault) => `${name}: ${fault}`));
  expect(faults).toEqual([]);
}
