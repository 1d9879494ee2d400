import { COMMON_NAMES, COMMON_WORDS, CONTEXT_WORDS } from "./common-stems";
import { isCommonPassword, readings } from "./common-passwords";

export const PASSWORD_MIN = 12;
export const PASSWORD_MAX = 256;
/** Letters that must be left of a password beside words that a guesser of this person would try. */
const OWN_LETTERS = 8;

/** What a guesser knows of the person. */
export type AboutPerson = { name: string; email: string; companies?: readonly string[] };

const wordsOf = (text: string) => text.toLowerCase().split(/[^\p{L}]+/u).filter((word) => word.length >= 4);

function contextOf({ name, email, companies = [] }: AboutPerson): string[] {
  const whole = [name, email.split("@")[0] ?? "", ...companies].map((text) => text.toLowerCase().replaceAll(/[^\p{L}]/gu, "")).filter((text) => text.length >= 4);
  return [...CONTEXT_WORDS, ...whole, ...wordsOf(name), ...wordsOf(email), ...companies.flatMap(wordsOf)];
}

const longestFirst = (words: string[]) => [...new Set(words)].sort((one, two) => two.length - one.length);

function builtOn(reading: string, context: string[], common: string[]): boolean {
  const without = longestFirst(context).reduce((rest, word) => rest.replaceAll(word, " "), reading);
  if (without === reading) return false;
  const own = common.reduce((rest, word) => rest.replaceAll(word, " "), without);
  return own.replaceAll(" ", "").length < OWN_LETTERS;
}

/** Why a new password can't be taken, in words; null when it can. It is looked at exactly as typed; length is the only form asked of it. */
export function denyPassword(password: string, about: AboutPerson): string | null {
  const length = [...password].length;
  if (length < PASSWORD_MIN) return `At least ${PASSWORD_MIN} characters; a few words in a row are easy to keep in mind.`;
  if (length > PASSWORD_MAX) return `At most ${PASSWORD_MAX} characters.`;
  if (isCommonPassword(password)) return "This is among the passwords that are tried first. Take another, such as four words that have nothing to do with each other.";
  const common = longestFirst([...COMMON_WORDS, ...COMMON_NAMES]).filter((word) => word.length >= 4);
  const context = contextOf(about);
  if (readings(password).some((reading) => builtOn(reading, context, common))) return "This is built on your name, your company or a word of the trade. Take something that nobody would connect with you.";
  return null;
}
