import { expect, it } from "vitest";
import { unsafeCountTry, unsafeForgetTries } from "@/lib/viewer/commands";
import { LIMITS } from "@/lib/viewer/limits";
import { withDatabase } from "../../support/database";

withDatabase();

const { max, windowSeconds } = LIMITS["sign-in-account"];
const at = (seconds: number) => new Date(Date.UTC(2026, 10, 1) + seconds * 1000);
const tryAt = (subject: string, seconds: number) => unsafeCountTry("sign-in-account", subject, at(seconds)).then(() => "counted", (error: { code: string }) => error.code);

it("counts parallel tries one by one", async () => {
  const answers = await Promise.all(Array.from({ length: 50 }, () => tryAt("parallel", 0)));
  expect(answers.filter((one) => one === "counted")).toHaveLength(max);
});

it("begins anew when the window has ended, and not before", async () => {
  for (let i = 0; i < max; i += 1) expect(await tryAt("window", i)).toBe("counted");
  expect(await tryAt("window", windowSeconds - 1)).toBe("too_many");
  expect(await tryAt("window", windowSeconds)).toBe("counted");
  expect(await tryAt("window", windowSeconds + 1)).toBe("counted");
});

it("says how long to wait", async () => {
  for (let i = 0; i < max; i += 1) await tryAt("wait", 0);
  await expect(unsafeCountTry("sign-in-account", "wait", at(60))).rejects.toMatchObject({ retryAfterSeconds: windowSeconds - 60 });
});

it("forgets after a success, and counts other subjects apart", async () => {
  for (let i = 0; i <= max; i += 1) await tryAt("honest", 0);
  expect(await tryAt("honest", 1)).toBe("too_many");
  expect(await tryAt("somebody else", 1)).toBe("counted");
  await unsafeForgetTries("sign-in-account", "honest");
  expect(await tryAt("honest", 2)).toBe("counted");
});
