import { posix } from "node:path";
import ts from "typescript";

export type Import = { target: string; typeOnly: boolean };

/** A source file taken apart far enough for every check. */
export type Source = { path: string; text: string; tree: ts.SourceFile; imports: Import[] };

/** Every node below a node, itself included. */
export function* nodesOf(node: ts.Node): Generator<ts.Node> {
  yield node;
  const children: ts.Node[] = [];
  ts.forEachChild(node, (child) => {
    children.push(child);
  });
  for (const child of children) yield* nodesOf(child);
}

/** Stands for an import whose target is worked out at run time; no kind of file may have one. */
export const UNREADABLE = "(worked out at run time)";

const literal = (node: ts.Node | undefined) => (node && ts.isStringLiteralLike(node) ? node.text : UNREADABLE);

function importOf(node: ts.Node): Import | null {
  // Only `import type {…}` vanishes: under verbatimModuleSyntax `import { type A }` still loads the file.
  if (ts.isImportDeclaration(node)) return { target: literal(node.moduleSpecifier), typeOnly: node.importClause?.isTypeOnly ?? false };
  if (ts.isExportDeclaration(node) && node.moduleSpecifier) return { target: literal(node.moduleSpecifier), typeOnly: node.isTypeOnly };
  if (ts.isImportTypeNode(node)) return { target: literal(ts.isLiteralTypeNode(node.argument) ? node.argument.literal : undefined), typeOnly: true };
  if (ts.isExternalModuleReference(node)) return { target: literal(node.expression), typeOnly: false };
  if (!ts.isCallExpression(node)) return null;
  const loads = node.expression.kind === ts.SyntaxKind.ImportKeyword || (ts.isIdentifier(node.expression) && node.expression.text === "require");
  return loads ? { target: literal(node.arguments[0]), typeOnly: false } : null;
}

/** Takes a file apart. */
export function readSource(path: string, text: string): Source {
  const tree = ts.createSourceFile(path, text, ts.ScriptTarget.ES2022, false, path.endsWith("x") ? ts.ScriptKind.TSX : ts.ScriptKind.TS);
  const imports = [...nodesOf(tree)].map(importOf).filter((one) => one !== null);
  return { path, text, tree, imports };
}

/** The path, without its ending, of one of our own files; null for a package. */
export function ownTarget(from: string, target: string): string | null {
  const inside = target.startsWith("@/") ? target.slice(2) : target.startsWith(".") ? posix.join(posix.dirname(from), target) : null;
  return inside === null ? null : posix.normalize(inside).replace(/\.tsx?$/, "");
}
