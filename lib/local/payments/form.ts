import { ApiError } from "./api-error";

/** A form-encoded body or query with its brackets resolved: `a[b][0]=c`. */
export type Form = string | Form[] | { [name: string]: Form };

type Branch = Map<string, Branch | string>;

const DEEPEST = 10;

/** Reads a form-encoded text. Numbered names become lists. */
export function readForm(text: string): { [name: string]: Form } {
  const root: Branch = new Map();
  for (const [name, value] of new URLSearchParams(text)) put(root, partsOf(name), value, name);
  return Object.fromEntries([...root].map(([name, branch]) => [name, resolve(branch)]));
}

function partsOf(name: string): string[] {
  const open = name.indexOf("[");
  if (open < 0) return [name];
  const inner = [...name.slice(open).matchAll(/\[([^[\]]*)\]/g)].map((found) => found[1] ?? "");
  return [name.slice(0, open), ...inner];
}

function put(root: Branch, parts: string[], value: string, name: string): void {
  if (parts.length > DEEPEST) throw new ApiError(400, { message: `Invalid parameter: ${name}`, param: name });
  let branch = root;
  parts.forEach((part, index) => {
    const key = part === "" ? String(branch.size) : part;
    if (index === parts.length - 1) return void branch.set(key, value);
    const inner = branch.get(key);
    const next: Branch = inner instanceof Map ? inner : new Map();
    branch.set(key, next);
    branch = next;
  });
}

function resolve(branch: Branch | string): Form {
  if (typeof branch === "string") return branch;
  const entries = [...branch].map(([name, inner]) => [name, resolve(inner)] as const);
  const isList = entries.length > 0 && entries.every(([name]) => /^\d+$/.test(name));
  return isList ? entries.map(([, inner]) => inner) : Object.fromEntries(entries);
}
