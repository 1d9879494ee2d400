import { expect, type APIRequestContext } from "@playwright/test";
import { letterTo, linkIn } from "./mail";
import type { Person } from "./people";

/** Opens a mailed link twice without pressing anything, as scanners of mail do. */
export async function scan(request: APIRequestContext, url: string): Promise<void> {
  for (let time = 1; time <= 2; time += 1) {
    const answer = await request.get(url);
    expect(answer.status()).toBe(200);
    expect(answer.headers()["set-cookie"]).toBeUndefined();
  }
}

/** Makes an account and proves its address by the mailed link; ends among the moves, signed in. */
export async function signUp({ page, name, email }: Person, password: string, request: APIRequestContext): Promise<void> {
  await page.goto("/");
  await page.getByRole("main").getByRole("link", { name: "Make an account" }).click();
  await page.getByLabel("Your name").fill(name);
  await page.getByLabel("E-mail address").fill(email);
  await page.getByRole("textbox", { name: "Password" }).fill(password);
  await page.getByRole("button", { name: "Make an account" }).click();
  await expect(page.getByRole("heading", { name: "Check your mail" })).toBeVisible();
  const url = linkIn(await letterTo(email, /Check your address/), "verify");
  await scan(request, url);
  await page.goto(url);
  await page.getByRole("button", { name: "Yes, I made this account" }).click();
  await expect(page.getByRole("heading", { level: 1, name: "Moves" })).toBeVisible();
}

type Asked = { unit: string; company: string; /** Typed on the page, where the letter did not say it. */ name: string | null };

/** Follows a letter of invitation: reads who asks, presses the one button, and is in. */
export async function join({ page, email }: Person, { unit, company, name }: Asked, request: APIRequestContext): Promise<void> {
  const url = linkIn(await letterTo(email, /asks you to join the move/), "join");
  await scan(request, url);
  await page.goto(url);
  await expect(page.getByRole("heading", { name: `Join the move of ${unit}` })).toBeVisible();
  await expect(page.getByRole("main")).toContainText(company);
  if (name) await page.getByRole("textbox", { name: "Your name" }).fill(name);
  await page.getByRole("button", { name: "Join the move" }).click();
  await expect(page.getByRole("heading", { name: `Join the move of ${unit}` })).toHaveCount(0);
}
