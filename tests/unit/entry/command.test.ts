import { describe, expect, it } from "vitest";
import { z } from "zod";
import { fieldErrors, parse, requireOurOrigin } from "@/lib/entry/command";
import { AppError } from "@/lib/errors";
import { TEST_ENVIRONMENT } from "../../support/environment";

Object.assign(process.env, TEST_ENVIRONMENT, { DATABASE_URL: "mysql://nobody@127.0.0.1/none" });

const OURS = "http://localhost:4999";

describe("where a write comes from", () => {
  const taken = (origin: string | null, site: string | null) => {
    const headers = new Headers();
    if (origin !== null) headers.set("origin", origin);
    if (site !== null) headers.set("sec-fetch-site", site);
    try {
      requireOurOrigin(headers);
      return "taken";
    } catch (error) {
      return error instanceof AppError ? error.code : String(error);
    }
  };

  it.each([
    ["one of our pages", OURS, "same-origin", "taken"],
    ["one of our pages in an older browser", OURS, null, "taken"],
    ["nowhere", null, null, "not_from_here"],
    ["nowhere, from the address bar", null, "none", "not_from_here"],
    ["nowhere, said to be ours", null, "same-origin", "not_from_here"],
    ["a page without an origin", "null", "cross-site", "not_from_here"],
    ["a page without an origin in an older browser", "null", null, "not_from_here"],
    ["a sibling host", "http://other.localhost:4999", "same-site", "not_from_here"],
    ["a sibling host that hides its origin as ours", OURS, "same-site", "not_from_here"],
    ["another site", "https://elsewhere.example", "cross-site", "not_from_here"],
    ["another site that claims our origin", OURS, "cross-site", "not_from_here"],
    ["our host on another port", "http://localhost:4998", "same-site", "not_from_here"],
    ["our host over https", "https://localhost:4999", "cross-site", "not_from_here"],
    ["a host that begins like ours", "http://localhost:4999.elsewhere.example", "cross-site", "not_from_here"],
    ["a host that ends like ours", "http://elsewhere-localhost:4999", "cross-site", "not_from_here"],
    ["ours with a path", `${OURS}/`, "same-origin", "not_from_here"],
    ["ours in capitals", "HTTP://LOCALHOST:4999", "same-origin", "not_from_here"],
    ["two origins", `${OURS}, https://elsewhere.example`, "same-origin", "not_from_here"],
    ["an empty origin", "", "same-origin", "not_from_here"],
    ["a made-up site word", OURS, "none", "not_from_here"],
  ])("from %s", (_, origin, site, answer) => {
    expect(taken(origin, site)).toBe(answer);
  });
});

describe("what is wrong with which field", () => {
  const schema = z.strictObject({ name: z.string("Enter a name."), legs: z.array(z.strictObject({ payer: z.string("Choose who pays.") })), day: z.iso.date("Enter a day.").optional() })
    .refine(({ name }) => name !== "wrong", "Name and legs do not go together.");
  const faults = (value: unknown) => {
    const { error } = schema.safeParse(value);
    return error ? { ...fieldErrors(error) } : null;
  };

  it("names every field, not the first alone, by its path", () => {
    expect(faults({ legs: [{ payer: "a" }, {}, { payer: 1 }], day: "32" })).toEqual({
      name: ["Enter a name."], "legs.1.payer": ["Choose who pays."], "legs.2.payer": ["Choose who pays."], day: ["Enter a day."],
    });
  });

  it("names fields that are none, also deep down", () => {
    expect(faults({ name: "a", legs: [{ payer: "b", admin: true, role: 1 }], siteAdmin: true })).toEqual({
      "legs.0.admin": ["Not a field of this form."], "legs.0.role": ["Not a field of this form."], siteAdmin: ["Not a field of this form."],
    });
  });

  it("puts what concerns no single field under the form", () => {
    expect(faults({ name: "wrong", legs: [] })).toEqual({ form: ["Name and legs do not go together."] });
    expect(faults("nothing")).toEqual({ form: [expect.any(String)] });
  });

  it.each(["constructor", "toString", "hasOwnProperty", "valueOf"])("a stranger named %s is named like any other", (name) => {
    expect(faults({ name: "a", legs: [], [name]: 1 })).toEqual({ [name]: ["Not a field of this form."] });
  });

  it("a key named __proto__ is refused or without effect, and breaks nothing", () => {
    const value = JSON.parse('{"name":"a","legs":[{"payer":"b","__proto__":{"admin":true}}],"__proto__":{"admin":true}}') as unknown;
    const parsed = schema.safeParse({ ...(value as object) });
    if (parsed.success) expect(parsed.data).toStrictEqual({ name: "a", legs: [{ payer: "b" }] });
    else expect(Object.keys(fieldErrors(parsed.error)).length).toBeGreaterThan(0);
    expect(({} as Record<string, unknown>).admin).toBeUndefined();
  });

  it("parse refuses with all of them", () => {
    expect(() => parse(schema, {})).toThrow(expect.objectContaining({ code: "bad_input", fields: { name: ["Enter a name."], legs: [expect.any(String)] } }));
    expect(parse(schema, { name: "a", legs: [] })).toEqual({ name: "a", legs: [] });
  });
});
