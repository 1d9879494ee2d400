import { COMMON_NAMES, COMMON_WORDS } from "./common-stems";

/** Orders in which fingers go over a keyboard, letters and digits alone; each also backwards. */
const WALKS = [
  "01234567890123456789", "abcdefghijklmnopqrstuvwxyzabcdefghijklmnopqrstuvwxyz",
  "qwertyuiopasdfghjklzxcvbnmqwertyuiop", "qwertzuiopasdfghjklyxcvbnm", "azertyuiopqsdfghjklmwxcvbn",
  "1234567890qwertyuiop", "asdfghjkl1234567890", "zxcvbnm1234567890",
  "1qaz2wsx3edc4rfv5tgb6yhn7ujm8ik9ol0p", "1qaz2wsx3edc4rfv", "1qazxsw23edcvfr45tgbnhy67ujm", "qazwsxedcrfvtgbyhnujmikolp", "qazxswedcvfrtgbnhyujm",
  "1q2w3e4r5t6y7u8i9o0p", "q1w2e3r4t5y6u7i8o9p0", "1a2b3c4d5e6f7g8h9i", "a1b2c3d4e5f6g7h8i9", "a1s2d3f4g5h6j7k8l9", "147258369", "741852963", "159357", "zaq12wsxcde34rfvbgt56yhn",
].flatMap((walk) => [walk, [...walk].reverse().join("")]);

const STEMS = new Set([...COMMON_WORDS, ...COMMON_NAMES]);

const TWINS: Record<string, string> = { "0": "o", "1": "i", "3": "e", "4": "a", "5": "s", "7": "t", "@": "a", $: "s", "!": "i", "|": "l", "€": "e" };

const lettersOf = (text: string) => text.replaceAll(/[^\p{L}]/gu, "");
const untwin = (text: string) => [...text].map((char) => TWINS[char] ?? char).join("");

/** The letters of a password as a guesser reads them: with look-alike characters kept, and with them turned back into letters. */
export function readings(password: string): string[] {
  const lower = password.toLowerCase();
  const core = lower.replaceAll(/^[^\p{L}]+|[^\p{L}]+$/gu, "");
  return [...new Set([lettersOf(lower), lettersOf(untwin(core)), lettersOf(untwin(lower))])].filter((reading) => reading !== "");
}

/** Whether the text is pieces of the given kind, one after the other, at most `most` of them. */
function splitsInto(text: string, most: number, isPiece: (piece: string) => boolean): boolean {
  if (text === "") return true;
  if (most === 0) return false;
  for (let end = text.length; end > 0; end -= 1) {
    if (isPiece(text.slice(0, end)) && splitsInto(text.slice(end), most - 1, isPiece)) return true;
  }
  return false;
}

/** The shortest part that the text repeats from end to end; the text itself when it repeats nothing. */
function repeatedPart(text: string): string {
  const chars = [...text];
  for (let size = 1; size <= chars.length / 2; size += 1) {
    if (chars.length % size === 0 && chars.every((char, at) => char === chars[at % size])) return chars.slice(0, size).join("");
  }
  return text;
}

const isWalk = (piece: string) => piece.length >= 3 && WALKS.some((walk) => walk.includes(piece));
const isRun = (piece: string) => piece.length >= 2 && repeatedPart(piece).length === 1;
const isYear = (piece: string) => /^(19|20)\d\d$/.test(piece);

/** Spaces show that somebody made groups of their own, so they end the likeness. */
function isWalkLike(password: string): boolean {
  if (/\s/.test(password)) return false;
  const plain = password.toLowerCase().replaceAll(/[^\p{L}\p{N}]/gu, "");
  const halved = plain.replaceAll(/(.)\1/gu, "$1");
  return plain !== "" && [plain, halved].some((text) => splitsInto(text, 4, (piece) => isWalk(piece) || isRun(piece) || isYear(piece)));
}

const isStemLike = (text: string) =>
  splitsInto(text, 2, (piece) => STEMS.has(piece) || (piece.length >= 4 && isWalk(piece))) || (text.endsWith("s") && STEMS.has(text.slice(0, -1)));

/** Whether a password is one that guessers try first: a common word or two with digits around them, one short thing repeated, or a walk over the keyboard. */
export function isCommonPassword(password: string): boolean {
  const part = repeatedPart(password.toLowerCase());
  if ([...part].length < 6 && part !== password.toLowerCase()) return true;
  if (isWalkLike(password)) return true;
  return readings(password).flatMap((reading) => [reading, repeatedPart(reading)]).some(isStemLike);
}

const PATTERNS: ((stem: string) => string)[] = [
  (stem) => `${stem}${stem}`, (stem) => `${stem}123`, (stem) => `${stem}1234`, (stem) => `${stem}12345`, (stem) => `${stem}123456`, (stem) => `${stem}1234567890`,
  (stem) => `${stem}2024`, (stem) => `${stem}2025!`, (stem) => `${stem}@2026`, (stem) => `${stem}1990`, (stem) => `${stem}01011990`, (stem) => `123456${stem}`,
  (stem) => `${stem.charAt(0).toUpperCase()}${stem.slice(1)}123!`, (stem) => `${stem}_password`, (stem) => `${stem}${stem}1`, (stem) => `${stem}!!!!!!`, (stem) => `i love ${stem}`,
];

/** The passwords that the rule above stands for, spelled out: every stem in the patterns that rankings of leaked passwords show. */
export function* commonPasswords(): Generator<string> {
  for (const stem of STEMS) for (const pattern of PATTERNS) yield pattern(stem);
}
