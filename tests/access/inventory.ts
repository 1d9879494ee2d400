import { existsSync, readdirSync, readFileSync } from "node:fs";
import ts from "typescript";
import { nodesOf, ownTarget, readSource, type Source } from "../unit/boundaries/read";

/** A function that a room offers: where it stands and what it takes first. */
export type Offered = { file: string; room: string; name: string; takesFirst: string | null };

const DATA_FILE = /^lib\/([a-z-]+)\/(?:queries|commands)(?:\/[a-z0-9-]+)*\.ts$/;
const METHODS = ["GET", "HEAD", "POST", "PUT", "PATCH", "DELETE", "OPTIONS"];

const sourcesOf = (folder: string): Source[] =>
  existsSync(folder)
    ? readdirSync(folder, { recursive: true, encoding: "utf8" })
        .filter((name) => /\.tsx?$/.test(name))
        .map((name) => readSource(`${folder}/${name}`, readFileSync(`${folder}/${name}`, "utf8")))
    : [];

export const readTree = (): Source[] => ["app", "components", "emails", "lib"].flatMap(sourcesOf);

const isExported = (node: ts.Statement) => ts.canHaveModifiers(node) && (ts.getModifiers(node) ?? []).some((one) => one.kind === ts.SyntaxKind.ExportKeyword);

type Named = { name: string; takesFirst: string | null };

const firstOf = (parameters: ts.NodeArray<ts.ParameterDeclaration>, tree: ts.SourceFile) => parameters[0]?.name.getText(tree) ?? null;

/** False for a plain value such as a number of seconds. */
const doesSomething = (initializer: ts.Expression | undefined) => initializer !== undefined && [...nodesOf(initializer)].some((node) => ts.isCallExpression(node) || ts.isFunctionLike(node) || ts.isIdentifier(node));

/** Everything that a file exports and that can be called when the program runs. */
export function exportsOf({ tree }: Pick<Source, "tree">): Named[] {
  return tree.statements.flatMap((node): Named[] => {
    if (ts.isExportDeclaration(node) && !node.isTypeOnly) {
      if (!node.exportClause || !ts.isNamedExports(node.exportClause)) return [{ name: "*", takesFirst: null }];
      return node.exportClause.elements.filter((one) => !one.isTypeOnly).map((one) => ({ name: one.name.getText(tree), takesFirst: null }));
    }
    if (ts.isExportAssignment(node)) return [{ name: "default", takesFirst: null }];
    if (!isExported(node)) return [];
    if (ts.isFunctionDeclaration(node)) return [{ name: node.name?.text ?? "default", takesFirst: firstOf(node.parameters, tree) }];
    if (ts.isClassDeclaration(node)) return [{ name: node.name?.text ?? "default", takesFirst: null }];
    if (!ts.isVariableStatement(node)) return [];
    return node.declarationList.declarations.filter(({ initializer }) => doesSomething(initializer)).map(({ name, initializer }) => ({ name: name.getText(tree), takesFirst: initializer && ts.isArrowFunction(initializer) ? firstOf(initializer.parameters, tree) : null }));
  });
}

/** Queries and commands of every room. Those named `unsafe…` say themselves that the caller has checked. */
export function offeredBy(tree: readonly Source[]): Offered[] {
  return tree.flatMap((source) => {
    const room = DATA_FILE.exec(source.path)?.[1];
    return room ? exportsOf(source).filter(({ name }) => !name.startsWith("unsafe")).map((one) => ({ file: source.path, room, ...one })) : [];
  });
}

/** The address that a file under app/ answers to. */
const addressOf = (path: string) => `/${path.split("/").slice(1, -1).filter((part) => !part.startsWith("(")).join("/")}`;

/** Every method of every door, such as `GET /api/v1/moves`. */
export const doorsOf = (tree: readonly Source[]): string[] =>
  tree.filter(({ path }) => /^app\/(?:.+\/)?route\.tsx?$/.test(path)).flatMap((source) => exportsOf(source).filter(({ name }) => METHODS.includes(name)).map(({ name }) => `${name} ${addressOf(source.path)}`));

export const pagesOf = (tree: readonly Source[]): string[] => tree.filter(({ path }) => /^app\/(?:.+\/)?page\.tsx$/.test(path)).map(({ path }) => addressOf(path));

const isServerOnly = ({ tree }: Source) => {
  const first = tree.statements[0];
  return first !== undefined && ts.isExpressionStatement(first) && ts.isStringLiteral(first.expression) && first.expression.text === "use server";
};

/** Functions that a browser can call without a door of their own, such as `signIn of /sign-in`. */
export const actionsOf = (tree: readonly Source[]): string[] => tree.filter(isServerOnly).flatMap((source) => exportsOf(source).map(({ name }) => `${name} of ${addressOf(source.path)}`));

/** Files with a directive inside a function, which would make a door that no list shows. */
export const inlineActionsOf = (tree: readonly Source[]): string[] =>
  tree.filter(({ tree: file }) => [...nodesOf(file)].some((node) => ts.isBlock(node) && node.statements.some((one) => ts.isExpressionStatement(one) && ts.isStringLiteral(one.expression) && one.expression.text === "use server"))).map(({ path }) => path);

/** Files that import a name from a file. */
export function importersOf(tree: readonly Source[], { file, name }: Pick<Offered, "file" | "name">): string[] {
  const target = file.replace(/\.ts$/, "");
  return tree.filter((source) =>
    source.tree.statements.some((node) =>
      ts.isImportDeclaration(node) && ts.isStringLiteral(node.moduleSpecifier) && ownTarget(source.path, node.moduleSpecifier.text) === target && node.importClause?.namedBindings !== undefined &&
      (!ts.isNamedImports(node.importClause.namedBindings) || node.importClause.namedBindings.elements.some((one) => (one.propertyName ?? one.name).text === name)),
    ),
  ).map(({ path }) => path);
}
