import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import ts from 'typescript';

const ROOT = join(import.meta.dirname, '../..');
const GROUNDS = ['defineAction', 'guarded', 'guardedForm'];
const METHODS = ['GET', 'HEAD', 'POST', 'PUT', 'PATCH', 'DELETE', 'OPTIONS'];

export type Found = { readonly file: string; readonly source: ts.SourceFile };

const sourcesIn = (folder: string): readonly Found[] =>
  readdirSync(join(ROOT, folder), { recursive: true, encoding: 'utf8' })
    .filter((name) => /\.tsx?$/.test(name))
    .map((name) => ({ file: join(folder, name), text: readFileSync(join(ROOT, folder, name), 'utf8') }))
    // Reading a source takes long: only those that can hold a door.
    .filter(({ file, text }) => text.includes('use server') || /\/route\.tsx?$/.test(file))
    .map(({ file, text }) => ({ file, source: ts.createSourceFile(file, text, ts.ScriptTarget.Latest, true) }));

const isDirective = (node: ts.Node, text: string): boolean =>
  ts.isExpressionStatement(node) && ts.isStringLiteral(node.expression) && node.expression.text === text;

const isExported = (node: ts.Statement): boolean =>
  ts.canHaveModifiers(node) && (ts.getModifiers(node) ?? []).some(({ kind }) => kind === ts.SyntaxKind.ExportKeyword);

/** What a file of server actions exports: each name with what it is made by, or null for what is no such call. */
function actionsIn({ source }: Found): ReadonlyMap<string, string | null> {
  const found = new Map<string, string | null>();
  for (const statement of source.statements) {
    if (ts.isExportDeclaration(statement) || ts.isExportAssignment(statement)) found.set(statement.getText(), null);
    else if (!isExported(statement) || ts.isTypeAliasDeclaration(statement) || ts.isInterfaceDeclaration(statement)) continue;
    else if (ts.isVariableStatement(statement)) {
      for (const { name, initializer } of statement.declarationList.declarations) {
        const isCall = initializer !== undefined && ts.isCallExpression(initializer) && ts.isIdentifier(initializer.expression);
        found.set(name.getText(), isCall ? initializer.expression.getText() : null);
      }
    } else if (ts.isFunctionDeclaration(statement)) found.set(statement.name?.text ?? 'default', null);
    else found.set(statement.getText(), null);
  }
  return found;
}

/** Where a name comes from, as the file imports it under that very name. */
function importsOf({ source: file }: Found): ReadonlyMap<string, string> {
  const from = new Map<string, string>();
  for (const statement of file.statements) {
    const named = ts.isImportDeclaration(statement) ? statement.importClause?.namedBindings : undefined;
    if (named === undefined || !ts.isNamedImports(named) || !ts.isImportDeclaration(statement)) continue;
    const source = ts.isStringLiteral(statement.moduleSpecifier) ? statement.moduleSpecifier.text : '';
    for (const { name, propertyName } of named.elements) if (propertyName === undefined) from.set(name.text, source);
  }
  return from;
}

export const isOfActions = ({ source }: Found): boolean => source.statements.some((statement) => isDirective(statement, 'use server'));

/** Whether some function carries the directive by itself: an action that nobody would find. */
export function hasHiddenAction({ source }: Found): boolean {
  const look = (node: ts.Node): boolean =>
    (ts.isBlock(node) && node.statements.some((statement) => isDirective(statement, 'use server'))) ||
    (ts.forEachChild(node, look) ?? false);
  return look(source);
}

const handlersIn = ({ source }: Found): readonly string[] =>
  source.statements.filter(isExported).flatMap((statement) => {
    if (ts.isFunctionDeclaration(statement)) return [statement.name?.text ?? ''];
    return ts.isVariableStatement(statement) ? statement.declarationList.declarations.map(({ name }) => name.getText()) : [];
  });

/** Faults of one file of actions. */
export const ungrounded = (found: Found): readonly string[] =>
  [...actionsIn(found)]
    .filter(([, by]) => by === null || !GROUNDS.includes(by) || importsOf(found).get(by) !== '@/lib/server/define-action')
    .map(([name]) => `${found.file} ${name}`);

/** Sources that can hold a door. */
export const everySource = (): readonly Found[] => ['app', 'components', 'lib'].flatMap(sourcesIn);

/** Every server action and every handler of a route there is, by file and name. */
export function everyDoor(): readonly string[] {
  const all = everySource();
  const actions = all.filter(isOfActions).flatMap((found) => [...actionsIn(found).keys()].map((name) => `${found.file} ${name}`));
  const handlers = all
    .filter(({ file }) => /^app\/.*\/route\.tsx?$/.test(file))
    .flatMap((found) =>
      handlersIn(found)
        .filter((name) => METHODS.includes(name))
        .map((name) => `${found.file} ${name}`),
    );
  return [...actions, ...handlers].toSorted();
}
