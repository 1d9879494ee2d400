import ts from "typescript";
import { kindOf } from "./kinds";
import { nodesOf, type Source } from "./read";

const MAX_LINES = 300;

const MAY_READ_ENVIRONMENT = /^(?:lib\/env\.ts|(?:next|drizzle|playwright|vitest)\.config\.ts|lib\/local\/.+|tests\/.+)$/;

/** Attributes and calls that carry a path of ours. */
const LINK_ATTRIBUTES = new Set(["href", "action", "formAction"]);
const LINK_CALLS = new Set(["push", "replace", "prefetch", "redirect", "permanentRedirect", "revalidatePath", "fetch", "call", "read"]);

const isMember = (node: ts.Node, object: string, member: string) =>
  (ts.isPropertyAccessExpression(node) && node.name.text === member && ts.isIdentifier(node.expression) && node.expression.text === object) ||
  (ts.isElementAccessExpression(node) && ts.isIdentifier(node.expression) && node.expression.text === object && ts.isStringLiteralLike(node.argumentExpression) && node.argumentExpression.text === member);

const startOf = (node: ts.Node | undefined): string => {
  if (!node) return "";
  if (ts.isJsxExpression(node) || ts.isParenthesizedExpression(node)) return startOf(node.expression);
  if (ts.isStringLiteralLike(node)) return node.text;
  return ts.isTemplateExpression(node) ? node.head.text : "";
};

/** A path of ours begins with one slash; "//" would be another host. */
const isPath = (node: ts.Node | undefined) => /^\/(?!\/)/.test(startOf(node));

/** Texts have a `replace` too, and a lone slash is a fair thing to replace in one. */
const isLongPath = (node: ts.Node | undefined) => /^\/[a-z]/i.test(startOf(node));

function linkProblem(node: ts.Node): boolean {
  if (ts.isJsxAttribute(node)) return ts.isIdentifier(node.name) && LINK_ATTRIBUTES.has(node.name.text) && isPath(node.initializer);
  if (ts.isPropertyAssignment(node)) return ts.isIdentifier(node.name) && node.name.text === "href" && isPath(node.initializer);
  if (!ts.isCallExpression(node)) return false;
  const called = ts.isPropertyAccessExpression(node.expression) ? node.expression.name : node.expression;
  if (!ts.isIdentifier(called) || !LINK_CALLS.has(called.text)) return false;
  return called.text === "replace" ? isLongPath(node.arguments[0]) : isPath(node.arguments[0]);
}

const isClockRead = (node: ts.Node) =>
  (ts.isNewExpression(node) && ts.isIdentifier(node.expression) && node.expression.text === "Date" && (node.arguments ?? []).length === 0) || isMember(node, "Date", "now") || isMember(node, "performance", "now");

function nodeProblems(node: ts.Node, path: string): string[] {
  const found: string[] = [];
  const kind = kindOf(path)?.kind;
  const ours = /^(?:app|components|db|emails|lib)\//.test(path);
  if (isMember(node, "process", "env") && !MAY_READ_ENVIRONMENT.test(path)) found.push("reads the environment; ask lib/env");
  if (ours && isMember(node, "Math", "random")) found.push("uses Math.random; ids and secrets come from lib/ids");
  if (ours && isMember(node, "sql", "raw")) found.push("uses sql.raw; parameters keep data out of the statement");
  if (ts.isIdentifier(node) && node.text === "dangerouslySetInnerHTML" && ours) found.push("uses dangerouslySetInnerHTML");
  if (ts.isStringLiteralLike(node) && node.text === "dangerouslySetInnerHTML" && ours) found.push("uses dangerouslySetInnerHTML");
  if (/^(?:app|components)\//.test(path) && linkProblem(node)) found.push("types a path by hand; build it with lib/routes");
  if ((kind === "pure" || kind === "trade") && isClockRead(node)) found.push("reads the clock; time is passed in");
  return found;
}

const hasDirective = (tree: ts.SourceFile, directive: string) =>
  tree.statements.some((statement) => ts.isExpressionStatement(statement) && ts.isStringLiteral(statement.expression) && statement.expression.text === directive);

/** What no file of its kind does, whatever it imports. */
export function habitProblems({ path, text, tree, imports }: Source): string[] {
  const found = [...nodesOf(tree)].flatMap((node) => nodeProblems(node, path).map((problem) => `${path} ${problem}`));
  const lines = text.replace(/\n$/, "").split("\n").length;
  if (lines > MAX_LINES) found.push(`${path}: ${lines} lines, more than ${MAX_LINES}`);
  if (/\/(?:page|layout)\.tsx$/.test(path) && hasDirective(tree, "use client")) found.push(`${path}: pages and layouts stay on the server`);
  if (/\/index\.tsx?$/.test(path) && !/^(?:db\/schema|lib\/local)\//.test(path)) found.push(`${path}: no barrels`);
  if (imports.some(({ target }) => /^(?:node:)?process$/.test(target)) && !MAY_READ_ENVIRONMENT.test(path)) found.push(`${path} reads the environment; ask lib/env`);
  return [...new Set(found)];
}
