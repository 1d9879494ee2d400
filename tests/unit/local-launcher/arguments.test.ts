import { describe, expect, it } from "vitest";
import { requireNode, startMode } from "@/lib/local/arguments";
import { appUrlOf, missingServices } from "@/lib/local/environment";
import { portsFrom, START_PORTS, TEST_PORTS } from "@/lib/local/ports";
import { readChoice, STEPS } from "@/tests/support/runner/choice";

const NOTHING: NodeJS.ProcessEnv = { NODE_ENV: "test" };

describe("the words behind npm start", () => {
  it.each([
    [[], "site"],
    [["--dev"], "development"],
    [["--database"], "database"],
  ])("%j mean %s", (words, mode) => expect(startMode(words)).toBe(mode));

  it.each([[["--devel"]], [["--dev", "--database"]], [["site"]]])("%j are refused", (words) => {
    expect(() => startMode(words)).toThrow("is not understood");
  });
});

describe("the words behind npm test", () => {
  it("are not needed: all steps run", () => expect(readChoice([])).toEqual({ steps: [...STEPS], extra: [] }));

  it("choose steps, which run in the usual order", () => {
    expect(readChoice(["e2e", "unit"])).toEqual({ steps: ["unit", "e2e"], extra: [] });
  });

  it("hand the rest to the runner", () => {
    expect(readChoice(["e2e", "-g", "signs", "unit"])).toEqual({ steps: ["e2e"], extra: ["-g", "signs", "unit"] });
  });

  it.each([[["units"]], [["-g", "x"]]])("%j are refused", (words) => expect(() => readChoice(words)).toThrow("is no step"));
});

describe("the Node release", () => {
  it.each(["20.20.0", "v20.21.3"])("%s will do", (version) => expect(() => requireNode(version)).not.toThrow());
  it.each(["20.19.9", "18.20.0", "22.1.0", ""])("%s is refused", (version) => expect(() => requireNode(version)).toThrow("Node 20"));
});

describe("the ports", () => {
  it("are the usual ones unless a base is given", () => {
    expect(portsFrom(START_PORTS, undefined)).toBe(START_PORTS);
    expect(portsFrom(TEST_PORTS, "")).toBe(TEST_PORTS);
    expect(new Set(Object.values(portsFrom(START_PORTS, "5000"))).size).toBe(6);
  });

  it.each(["80", "70000", "5000.5", "many"])("are refused from %s", (base) => expect(() => portsFrom(START_PORTS, base)).toThrow("TOWFOLIO_PORT_BASE"));

  it("of a start and of the tests never meet", () => {
    const started = Object.values(START_PORTS);
    expect(Object.values(TEST_PORTS).filter((port) => started.includes(port))).toEqual([]);
  });
});

describe("the environment", () => {
  it("without keys calls for every stand-in", () => expect(missingServices(NOTHING)).toEqual(["mail", "uploads", "payments"]));

  it("with keys calls for none", () => {
    const given = { ...NOTHING, SMTP_URL: "smtp://a", UPLOADTHING_TOKEN: "t", STRIPE_SECRET_KEY: "s", STRIPE_WEBHOOK_SECRET: "w" };
    expect(missingServices(given)).toEqual([]);
  });

  it("with half of a service's keys is refused, naming the missing one", () => {
    expect(() => missingServices({ ...NOTHING, STRIPE_SECRET_KEY: "s" })).toThrow("STRIPE_WEBHOOK_SECRET");
  });

  it("may name another address for the site", () => {
    expect(appUrlOf(NOTHING, START_PORTS)).toBe("http://localhost:3000");
    expect(appUrlOf({ ...NOTHING, APP_URL: "https://cases.example" }, START_PORTS)).toBe("https://cases.example");
  });
});
