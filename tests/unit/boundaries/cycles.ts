import { ownTarget, type Source } from "./read";

/** Files that load each other at run time, one sentence for each circle; `import type` does not count. */
export function cycleProblems(sources: readonly Source[]): string[] {
  const paths = new Set(sources.map(({ path }) => path));
  const resolve = (target: string) => [`${target}.ts`, `${target}.tsx`, `${target}/index.ts`].find((path) => paths.has(path));
  const loads = new Map(
    sources.map(({ path, imports }) => [
      path,
      imports.flatMap(({ target, typeOnly }) => {
        const inside = typeOnly ? null : ownTarget(path, target);
        const found = inside === null ? undefined : resolve(inside);
        return found === undefined ? [] : [found];
      }),
    ]),
  );
  const done = new Set<string>();
  const trail: string[] = [];
  const found: string[] = [];
  const visit = (path: string): void => {
    const at = trail.indexOf(path);
    if (at >= 0) found.push(`circle: ${[...trail.slice(at), path].join(" -> ")}`);
    if (at >= 0 || done.has(path)) return;
    trail.push(path);
    for (const next of loads.get(path) ?? []) visit(next);
    trail.pop();
    done.add(path);
  };
  for (const { path } of sources) visit(path);
  return found;
}
