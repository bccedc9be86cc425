import ts from 'typescript';
import { parseSource, placeOf, type Source, walk } from './sources.ts';

/** Places that may read the environment: one file of the product, and the programs that stand beside it. */
const environmentReaders = [
  /^src\/server\/env\.ts$/,
  /^src\/commands\//,
  /^src\/fakes\/(main|settings)\.ts$/,
  /^tests\//,
  /\.(test|bench)\.tsx?$/,
];

/** Each place that reads the environment although it is not meant to. */
export function findEnvironmentReads(sources: Source[]): string[] {
  const bound = sources.filter(({ path }) => !environmentReaders.some((reader) => reader.test(path)));
  return bound.flatMap((source) =>
    walk(parseSource(source))
      .filter(readsEnvironment)
      .map((node) => placeOf(source, node)),
  );
}

function readsEnvironment(node: ts.Node): boolean {
  if (ts.isPropertyAccessExpression(node)) {
    const owner = node.expression.getText();
    return node.name.text === 'env' && (owner === 'process' || owner === 'import.meta');
  }
  if (ts.isElementAccessExpression(node))
    return (
      node.expression.getText() === 'process' && /^['"`]env['"`]$/.test(node.argumentExpression.getText())
    );
  if (ts.isBindingElement(node) && ts.isVariableDeclaration(node.parent.parent))
    return isNamed(node, 'env') && node.parent.parent.initializer?.getText() === 'process';
  if (ts.isImportSpecifier(node)) {
    const from = node.parent.parent.parent.moduleSpecifier.getText().slice(1, -1);
    return isNamed(node, 'env') && /^(node:)?process$/.test(from);
  }
  return false;
}

function isNamed(node: ts.BindingElement | ts.ImportSpecifier, name: string): boolean {
  return (node.propertyName ?? node.name).getText() === name;
}

/** Places that may speak to the database. */
const databaseSpeakers = [
  /^src\/features\/[^/]+\/[^/]+\.repository\.ts$/,
  /^src\/server\/(auth|db)\//,
  /^(migrations|seeds)\//,
  /^knexfile\.ts$/,
  /^src\/commands\/data\//,
  /^tests\//,
  /\.(test|bench)\.tsx?$/,
];
const handleNames = new Set(['db', 'knex', 'trx', 'transaction', 'database']);
const statement =
  /^\s*(select\s.+\sfrom|insert\s+into|update\s+\S+\s+set|delete\s+from|(create|alter|drop)\s+table)\s/is;

/** Each query written outside the places that may hold one. */
export function findStrayQueries(sources: Source[]): string[] {
  const bound = sources.filter(({ path }) => !databaseSpeakers.some((speaker) => speaker.test(path)));
  return bound.flatMap((source) =>
    walk(parseSource(source))
      .filter(isQuery)
      .map((node) => placeOf(source, node)),
  );
}

function isQuery(node: ts.Node): boolean {
  if (ts.isStringLiteralLike(node) || ts.isTemplateExpression(node))
    return statement.test(node.getText().slice(1));
  if (!ts.isCallExpression(node)) return false;
  const callee = node.expression;
  const [first] = node.arguments;
  // db('runs'), scope.db('runs'), and the builders that a handle has: db.select(…), scope.db.raw(…).
  if (isHandle(callee)) return first !== undefined && ts.isStringLiteralLike(first);
  if (!ts.isPropertyAccessExpression(callee) || !isHandle(callee.expression)) return false;
  return /^(raw|select|from|into|insert|with|schema|table|queryBuilder)$/.test(callee.name.text);
}

function isHandle(node: ts.Expression): boolean {
  if (ts.isIdentifier(node)) return handleNames.has(node.text);
  if (ts.isPropertyAccessExpression(node)) return handleNames.has(node.name.text);
  return ts.isCallExpression(node) && node.arguments.length === 0 && isHandle(node.expression);
}

const testWords = new Set(['it', 'test', 'describe', 'suite', 'bench', 'context', 'ctx']);
const unrun = new Set(['skip', 'only', 'todo', 'skipIf', 'runIf', 'fails']);

/** Each test that is marked to be left out, to run alone, or to fail. */
export function findUnrunTests(sources: Source[]): string[] {
  const tests = sources.filter(({ path }) => /^tests\/|\.(test|bench)\.tsx?$/.test(path));
  return tests.flatMap((source) =>
    walk(parseSource(source))
      .filter(isUnrun)
      .map((node) => placeOf(source, node)),
  );
}

function isUnrun(node: ts.Node): boolean {
  if (ts.isIdentifier(node))
    return /^(xit|xtest|xdescribe|fit|fdescribe)$/.test(node.text) && ts.isCallExpression(node.parent);
  if (ts.isPropertyAccessExpression(node))
    return unrun.has(node.name.text) && testWords.has(firstWord(node.expression));
  // it('…', { skip: true }, …)
  if (!ts.isPropertyAssignment(node) || !unrun.has(node.name.getText())) return false;
  const call = node.parent.parent;
  return ts.isCallExpression(call) && testWords.has(firstWord(call.expression));
}

/** `it` of `it`, `it.each` and `it.each([…])`. */
function firstWord(node: ts.Expression): string {
  if (ts.isPropertyAccessExpression(node) || ts.isCallExpression(node)) return firstWord(node.expression);
  return node.getText();
}

// Written in two parts, so that this file does not find itself.
const silencers = [
  '@ts-' + 'ignore',
  '@ts-' + 'nocheck',
  '@ts-' + 'expect-error',
  'biome-' + 'ignore',
  'eslint-' + 'disable',
  'c8 ' + 'ignore',
  'v8 ' + 'ignore',
];

/** Each comment that tells a checker to look away. */
export function findSilencedChecks(sources: Source[]): string[] {
  return sources.flatMap(({ path, text }) =>
    text
      .split('\n')
      .flatMap((line, index) =>
        silencers.some((word) => line.includes(word)) ? [`${path}:${index + 1}`] : [],
      ),
  );
}
