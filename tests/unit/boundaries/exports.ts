import ts from "typescript";
import { kindOf } from "./kinds";
import type { Source } from "./read";

/** What tells a query or command whom it works for: the viewer, a transaction opened for one, or the context that holds both. */
const ASKED_BY = /^(?:viewer|tx|ctx)$/;

const isExported = (node: ts.Node) => ts.canHaveModifiers(node) && (ts.getModifiers(node) ?? []).some(({ kind }) => kind === ts.SyntaxKind.ExportKeyword);

const hasComment = (node: ts.Node, { tree, text }: Source) => (ts.getLeadingCommentRanges(text, node.getFullStart()) ?? []).length > 0 && node.getStart(tree) > node.getFullStart();

function functionProblems(node: ts.FunctionDeclaration, source: Source): string[] {
  const name = node.name?.text ?? "(default)";
  if (name.startsWith("unsafe")) return hasComment(node, source) ? [] : [`${source.path}: ${name} has to say why it asks nobody`];
  const first = node.parameters[0]?.name;
  return first && ts.isIdentifier(first) && ASKED_BY.test(first.text) ? [] : [`${source.path}: ${name} must take the viewer (or tx) first, or be named unsafe…`];
}

function variableProblems(node: ts.VariableStatement, source: Source): string[] {
  const hidden = node.declarationList.declarations.filter(({ initializer }) => !initializer || !(ts.isLiteralExpression(initializer) || ts.isAsExpression(initializer)));
  return hidden.map(({ name }) => `${source.path}: export ${name.getText(source.tree)} as a function declaration, so that who asks can be checked`);
}

/** Queries and commands say whom they work for, and start as server files. Other server files only the latter. */
export function exportProblems(source: Source): string[] {
  const { path, tree } = source;
  const found: string[] = [];
  const [first] = tree.statements;
  const marked = first && ts.isImportDeclaration(first) && ts.isStringLiteral(first.moduleSpecifier) && first.moduleSpecifier.text === "server-only";
  if (kindOf(path)?.serverOnly && !marked) found.push(`${path}: must start with import "server-only"`);
  if (!/^lib\/[a-z-]+\/(?:queries|commands)(?:\/|\.ts$)/.test(path)) return found;
  for (const statement of tree.statements) {
    if (ts.isExportDeclaration(statement) && !statement.isTypeOnly) found.push(`${path}: queries and commands are exported where they are written`);
    if (ts.isExportAssignment(statement)) found.push(`${path}: no default export`);
    if (!isExported(statement)) continue;
    if (ts.isFunctionDeclaration(statement)) found.push(...functionProblems(statement, source));
    if (ts.isVariableStatement(statement)) found.push(...variableProblems(statement, source));
  }
  return found;
}
