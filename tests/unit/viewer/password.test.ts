import { describe, expect, it } from "vitest";
import { commonPasswords, isCommonPassword } from "@/lib/viewer/common-passwords";
import { denyPassword } from "@/lib/viewer/password";

const about = { name: "Rosalind Okafor", email: "r.okafor@vellum-ridge.example", companies: ["Vellum Ridge Heritage Line"] };

describe("common passwords", () => {
  it("refuses every one of more than 3,000 that are long enough", () => {
    const long = new Set([...commonPasswords()].filter((password) => password.length >= 12));
    expect(long.size).toBeGreaterThan(3000);
    expect([...long].filter((password) => !isCommonPassword(password))).toEqual([]);
  });

  it("refuses every shorter one of at least 8 characters too", () => {
    const eight = new Set([...commonPasswords()].filter((password) => password.length >= 8));
    expect(eight.size).toBeGreaterThan(5000);
    expect([...eight].filter((password) => !isCommonPassword(password))).toEqual([]);
  });

  it.each([
    "1qaz2wsx3edc", "q1w2e3r4t5y6", "qwertyuiopas", "qwerty123456", "123456qwerty", "zxcvbnmasdfg", "123qwe123qwe", "123456789987654321", "112233445566", "aaaaaaaaaaaa", "abcabcabcabc",
    "P@ssw0rd2026!", "Passw0rdPassw0rd", "iloveyou1234", "trustno1trustno1", "Summer2026!!!", "monkey dragon 1", "😀😀😀😀😀😀😀😀😀😀😀😀",
  ])("refuses %s", (password) => {
    expect(isCommonPassword(password)).toBe(true);
  });

  it.each(["aaaa bbbb cccc dddd", "correct horse battery staple", "7391 0468 2957 1830", "8305917264038172", "🚂🌧🧭🪵🔩🧤🪛🌾🪣🧱🌉🪨", "  Päss wide of the mark  ", "gravel lantern teaspoon"])("takes %s", (password) => {
    expect(isCommonPassword(password)).toBe(false);
    expect(denyPassword(password, about)).toBeNull();
  });
});

describe("passwords built on what a guesser knows", () => {
  it.each(["Towfolio2026!", "towfolio-towfolio", "locomotive 2783", "L0c0m0t1ve!!", "Okafor-2026-1967", "rosalind.okafor", "VellumRidge2026", "vellum-railroad", "Heritage Line 1", "engineer password"])("refuses %s", (password) => {
    expect(denyPassword(password, about)).toMatch(/built on|tried first/);
  });

  it("takes a trade word among enough others", () => {
    expect(denyPassword("my locomotive eats porridge daily", about)).toBeNull();
  });

  it.each([0, 1, 7, 8, 11])("refuses %i characters", (length) => {
    expect(denyPassword("xq7wäp9zt!k".slice(0, length), about)).toMatch(/At least 12/);
  });

  it("takes 12 and 256 characters, refuses 257, counting characters and not bytes", () => {
    const long = Array.from({ length: 256 }, (_, at) => String.fromCodePoint(0x1f300 + at)).join("");
    expect(denyPassword("xq7wäp9zt!kn", about)).toBeNull();
    expect(denyPassword(long, about)).toBeNull();
    expect(denyPassword(`${long}x`, about)).toMatch(/At most 256/);
  });
});
