import { eq } from "drizzle-orm";
import mysql from "mysql2/promise";
import { describe, expect, it } from "vitest";
import { db } from "@/db/client";
import { siteLog, users } from "@/db/schema";
import { adminWish, setSiteAdmin } from "@/lib/local/admin";
import { withDatabase } from "../../support/database";
import { seedUser } from "../../support/factories";

const { appUrl } = withDatabase();

describe("the first site administrator", () => {
  it("is a person who has an account and a checked address; nobody is one by default", async () => {
    const app = await mysql.createConnection({ uri: appUrl, timezone: "Z" });
    const at = new Date();
    expect(await db().select().from(users)).toEqual([]);
    await expect(setSiteAdmin(app, { email: "nobody@example.test", siteAdmin: true }, at)).rejects.toThrow(/Nobody has the address/);
    const unchecked = await seedUser("Unchecked", { email: "unchecked@example.test", emailVerified: false });
    await expect(setSiteAdmin(app, { email: "unchecked@example.test", siteAdmin: true }, at)).rejects.toThrow(/has not been checked/);
    const checked = await seedUser("Checked", { email: "checked@example.test" });
    expect(await setSiteAdmin(app, { email: "checked@example.test", siteAdmin: true }, at)).toMatch(/is a site administrator now/);
    const marks = await db().select({ id: users.id, siteAdmin: users.siteAdmin }).from(users);
    expect(marks).toEqual(expect.arrayContaining([{ id: unchecked, siteAdmin: false }, { id: checked, siteAdmin: true }]));
    await setSiteAdmin(app, { email: "checked@example.test", siteAdmin: false }, at);
    expect((await db().select().from(users).where(eq(users.id, checked)))[0]?.siteAdmin).toBe(false);
    expect((await db().select().from(siteLog)).map((row) => row.kind).sort()).toEqual(["site-admin.ended", "site-admin.made"]);
    await app.end();
  });

  it("is named by an address alone", () => {
    expect(adminWish([" A@Example.org"])).toEqual({ email: "a@example.org", siteAdmin: true });
    expect(adminWish(["--not", "a@example.org"])).toEqual({ email: "a@example.org", siteAdmin: false });
    for (const words of [[], ["a"], ["--not"], ["a@example.org", "b@example.org"]]) expect(() => adminWish(words)).toThrow(/Say whom/);
  });
});
