import { expect, it } from "vitest";
import { seal, unseal } from "@/lib/outbox/seal";
import { TEST_ENVIRONMENT } from "../../support/environment";

Object.assign(process.env, TEST_ENVIRONMENT, { DATABASE_URL: "mysql://nobody@127.0.0.1/none" });

it("opens to what was sealed, and looks different each time", () => {
  const text = JSON.stringify({ url: "http://localhost/enter/gravel-lantern", name: "Ä 🚂" });
  const [one, other] = [seal(text), seal(text)];
  expect([unseal(one), unseal(other)]).toEqual([text, text]);
  expect(one).not.toBe(other);
  expect(Buffer.from(one, "base64").toString("latin1")).not.toContain("gravel");
});

it("does not open when any byte was changed", () => {
  const bytes = Buffer.from(seal("gravel"), "base64");
  for (let at = 0; at < bytes.length; at += 1) {
    const changed = Buffer.from(bytes);
    changed.writeUInt8(changed.readUInt8(at) ^ 1, at);
    expect(() => unseal(changed.toString("base64"))).toThrow();
  }
});
