import { ApiError } from "./api-error";
import type { Form } from "./form";

/** Reads one parameter, or throws what the service would answer; `at` is its bracketed name. */
export type Reader<T> = (value: Form | undefined, at: string) => T;

type Read<Fields> = { [Name in keyof Fields]: Fields[Name] extends Reader<infer T> ? T : never };

const wrong = (param: string, message: string, code?: string) => new ApiError(400, { message, param, ...(code ? { code } : {}) });

/** Makes a reader of a parameter that may be left out. */
export const optional =
  <T>(reader: Reader<T>): Reader<T | undefined> =>
  (value, at) =>
    value === undefined ? undefined : reader(value, at);

function given(value: Form | undefined, at: string): Form {
  if (value === undefined) throw wrong(at, `Missing required param: ${at}.`, "parameter_missing");
  return value;
}

/** Text; an empty one would mean to unset something, which creating cannot. */
export function text(longest = 5000): Reader<string> {
  return (value, at) => {
    const found = given(value, at);
    if (typeof found !== "string") throw wrong(at, `Invalid string: ${JSON.stringify(found)}`);
    if (found === "") throw wrong(at, `You passed an empty string for '${at}'. We assume empty values are an attempt to unset a parameter; however '${at}' cannot be unset. You should remove '${at}' from your request or supply a non-empty value.`, "parameter_invalid_empty");
    if (found.length > longest) throw wrong(at, `Invalid string: ${found.slice(0, 20)}...; must be at most ${longest} characters`);
    return found;
  };
}

/** A whole number, in its decimal form and nothing else. */
export function integer(least = 0, most = Number.MAX_SAFE_INTEGER): Reader<number> {
  return (value, at) => {
    const found = text()(value, at);
    const number = Number(found);
    if (!/^-?\d{1,15}$/.test(found)) throw wrong(at, `Invalid integer: ${found}`, "parameter_invalid_integer");
    if (number < least) throw wrong(at, least === 0 ? "Invalid non-negative integer" : `This value must be greater than or equal to ${least}.`, "parameter_invalid_integer");
    if (number > most) throw wrong(at, `This value must be less than or equal to ${most}.`, "parameter_invalid_integer");
    return number;
  };
}

export const flag: Reader<boolean> = (value, at) => {
  const found = text()(value, at);
  if (found !== "true" && found !== "false") throw wrong(at, `Invalid boolean: ${found}`);
  return found === "true";
};

/** One of a few words. */
export function oneOf<const Word extends string>(...words: Word[]): Reader<Word> {
  return (value, at) => {
    const found = text()(value, at);
    const word = words.find((one) => one === found);
    if (word === undefined) throw wrong(at, `Invalid ${at}: must be one of ${words.join(", ")}`);
    return word;
  };
}

export const address: Reader<string> = (value, at) => {
  const found = text()(value, at);
  if (!/^https?:\/\//i.test(found)) throw wrong(at, "Invalid URL: An explicit scheme (such as https) must be provided.", "url_invalid");
  if (!URL.canParse(found)) throw wrong(at, "Not a valid URL", "url_invalid");
  return found;
};

export const email: Reader<string> = (value, at) => {
  const found = text(800)(value, at);
  if (!/^[^\s@]+@[^\s@]+\.[^\s@]+$/.test(found)) throw wrong(at, `Invalid email address: ${found}`, "email_invalid");
  return found;
};

const CURRENCIES = new Set(Intl.supportedValuesOf("currency").map((code) => code.toLowerCase()));

export const currency: Reader<string> = (value, at) => {
  const found = text()(value, at).toLowerCase();
  if (!CURRENCIES.has(found)) throw wrong(at, `Invalid currency: ${found}`);
  return found;
};

export function list<T>(reader: Reader<T>): Reader<T[]> {
  return (value, at) => {
    const found = given(value, at);
    if (!Array.isArray(found)) throw wrong(at, "Invalid array");
    return found.map((one, index) => reader(one, `${at}[${index}]`));
  };
}

/** A group of named parameters. Any name that is not listed is refused. */
export function hash<const Fields extends Record<string, Reader<unknown>>>(fields: Fields): Reader<Read<Fields>> {
  return (value, at) => {
    const found = given(value, at);
    if (typeof found === "string" || Array.isArray(found)) throw wrong(at, "Invalid object");
    const nameOf = (name: string) => (at ? `${at}[${name}]` : name);
    for (const name of Object.keys(found)) {
      if (!Object.hasOwn(fields, name)) throw wrong(nameOf(name), `Received unknown parameter: ${nameOf(name)}`, "parameter_unknown");
    }
    const read = Object.entries(fields).map(([name, reader]) => [name, reader(Object.hasOwn(found, name) ? found[name] : undefined, nameOf(name))]);
    return Object.fromEntries(read) as Read<Fields>;
  };
}

/** A parameter of the service which the stand-in does not play; better refused than accepted without effect. */
export const notPlayed: Reader<undefined> = (value, at) => {
  if (value !== undefined) throw wrong(at, `This stand-in does not play '${at}'.`);
  return undefined;
};

const MOST_KEYS = 50;
const LONGEST_KEY = 40;
const LONGEST_VALUE = 500;

/** Up to 50 pairs; keys to 40 and values to 500 characters. */
export const metadata: Reader<Record<string, string>> = (value, at) => {
  if (value === undefined || value === "") return {};
  if (typeof value !== "object") throw wrong(at, "Invalid object");
  const pairs = Object.entries(value);
  if (pairs.length > MOST_KEYS) throw wrong(at, `Metadata can have at most ${MOST_KEYS} keys`);
  for (const [key, content] of pairs) {
    if (typeof content !== "string") throw wrong(`${at}[${key}]`, "Metadata values must be strings");
    if (key.length > LONGEST_KEY) throw wrong(at, `Metadata keys can have up to ${LONGEST_KEY} characters, but you passed in one that is ${key.length} characters.`);
    if (content.length > LONGEST_VALUE) {
      throw wrong(`${at}[${key}]`, `Metadata values can have up to ${LONGEST_VALUE} characters, but you passed in a value that is ${content.length} characters.`);
    }
  }
  return Object.fromEntries(pairs.filter(([, content]) => content !== "").map(([key, content]) => [key, String(content)]));
};
