import { kindOf, roomOf, ROOMS } from "./kinds";
import { ownTarget, type Source } from "./read";

/** What a file imports against what its kind may import, and against the order of the rooms. */
export function importProblems({ path, imports }: Source): string[] {
  const kind = kindOf(path);
  if (!kind) return [`${path}: no kind of file covers it`];
  return imports.flatMap(({ target, typeOnly }) => {
    const inside = ownTarget(path, target);
    if (inside === null) return kind.packages.test(target) ? [] : [`${path} (${kind.kind}) may not import ${target}`];
    if (!kind.own.test(inside) && !(typeOnly && kind.types?.test(inside))) {
      const hint = kind.types?.test(inside) ? "; as a type it may, with `import type`" : "";
      return [`${path} (${kind.kind}) may not import ${inside}${hint}`];
    }
    // A vocabulary is common language: the schema of every table speaks it as well.
    if (/^lib\/[^/]+\/vocabulary$/.test(inside)) return [];
    const from = roomOf(path);
    const to = roomOf(inside);
    return from !== null && to !== null && to > from ? [`${path} reaches up from ${ROOMS[from]} to ${inside}`] : [];
  });
}
