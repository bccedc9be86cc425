import { dirname } from 'node:path';
import ts from 'typescript';
import { layerOf } from './layers.ts';
import { baseOf, type Words } from './locale-files.ts';
import { parseSource, projectFolder, type Source, walk } from './sources.ts';

/** The keys that a piece of code asks for, and the places where they cannot be told. */
export interface KeyUsage {
  used: Set<string>;
  unreadable: string[];
}

/**
 * Finds the keys asked for by every call of `t`, through the compiler's own knowledge of types: a key put together from
 * parts counts as each key that its parts allow, and one that could be any text at all is reported.
 */
export function findKeyUsage(sources: Source[]): KeyUsage {
  const product = sources.filter(({ path }) => path.startsWith('src/') && layerOf(path)?.name !== 'tests');
  const keys = product.flatMap((source) =>
    walk(parseSource(source)).flatMap((node) => keyArgument(node) ?? []),
  );
  const used = new Set(keys.flatMap((key) => (ts.isStringLiteralLike(key) ? [key.text] : [])));
  const unreadable: string[] = [];
  // Only files with a key that is not written out need the compiler's types, which take their time.
  const builders = product.filter((source) =>
    keys.some((key) => key.getSourceFile() === parseSource(source) && !ts.isStringLiteralLike(key)),
  );
  const program = createProgram(product, builders);
  const checker = program.getTypeChecker();
  for (const source of builders) {
    const tree = program.getSourceFile(virtualPath(source));
    if (!tree) throw new RangeError(`findKeyUsage: ${source.path} is not in the program`);
    for (const key of walk(tree).flatMap((node) => keyArgument(node) ?? [])) {
      const texts = possibleTexts(checker, key);
      if (!texts) unreadable.push(`${source.path}: ${key.getText(tree)}`);
      for (const text of texts ?? []) used.add(text);
    }
  }
  return { used, unreadable };
}

/** An Astro file takes part as the TSX that its compiler makes of it. */
function virtualPath({ path }: Source): string {
  return `${projectFolder}${path}${path.endsWith('.astro') ? '.tsx' : ''}`;
}

function createProgram(sources: Source[], roots: Source[]): ts.Program {
  const file = `${projectFolder}tsconfig.json`;
  const { config } = ts.readConfigFile(file, ts.sys.readFile);
  const { options } = ts.parseJsonConfigFileContent({ ...config, files: [] }, ts.sys, dirname(file));
  options.types = [];
  const texts = new Map(sources.map((source) => [virtualPath(source), parseSource(source).text]));
  const host = ts.createCompilerHost(options);
  const { fileExists, readFile, getSourceFile } = host;
  host.fileExists = (path) => texts.has(path) || fileExists(path);
  host.readFile = (path) => texts.get(path) ?? readFile(path);
  host.getSourceFile = (path, version, ...rest) => {
    const text = texts.get(path);
    return text === undefined
      ? getSourceFile(path, version, ...rest)
      : ts.createSourceFile(path, text, version, true);
  };
  const declarations = sources.filter(({ path }) => path.endsWith('.d.ts'));
  const astro = `${projectFolder}node_modules/astro/env.d.ts`;
  return ts.createProgram([astro, ...[...roots, ...declarations].map(virtualPath)], options, host);
}

/** The first argument of `t(…)` and `….t(…)`, or the `i18nKey` of a `Trans`. */
function keyArgument(node: ts.Node): ts.Expression | undefined {
  if (ts.isJsxAttribute(node) && node.name.getText() === 'i18nKey') {
    const value = node.initializer;
    return value && ts.isJsxExpression(value) ? value.expression : (value as ts.StringLiteral | undefined);
  }
  if (!ts.isCallExpression(node)) return undefined;
  const callee = node.expression;
  const name = ts.isPropertyAccessExpression(callee)
    ? callee.name.text
    : ts.isIdentifier(callee)
      ? callee.text
      : '';
  return name === 't' ? node.arguments[0] : undefined;
}

function possibleTexts(checker: ts.TypeChecker, node: ts.Expression): string[] | undefined {
  if (ts.isStringLiteralLike(node)) return [node.text];
  if (ts.isParenthesizedExpression(node)) return possibleTexts(checker, node.expression);
  if (ts.isConditionalExpression(node)) {
    const [whenTrue, whenFalse] = [node.whenTrue, node.whenFalse].map((branch) =>
      possibleTexts(checker, branch),
    );
    return whenTrue && whenFalse && [...whenTrue, ...whenFalse];
  }
  if (!ts.isTemplateExpression(node)) return literalTexts(checker.getTypeAtLocation(node), checker);
  let texts = [node.head.text];
  for (const span of node.templateSpans) {
    const parts = possibleTexts(checker, span.expression);
    if (!parts) return undefined;
    texts = texts.flatMap((text) => parts.map((part) => `${text}${part}${span.literal.text}`));
  }
  return texts;
}

function literalTexts(type: ts.Type, checker: ts.TypeChecker): string[] | undefined {
  const known = type.isTypeParameter() ? (checker.getBaseConstraintOfType(type) ?? type) : type;
  const members = known.isUnion() ? known.types : [known];
  const texts = members.map((member) =>
    member.isStringLiteral() || member.isNumberLiteral() ? String(member.value) : undefined,
  );
  return texts.every((text) => text !== undefined) ? texts : undefined;
}

/** Keys that nothing asks for, and keys asked for that are not there. A key without namespace is looked for in all. */
export function compareUsage(usage: KeyUsage, english: Words): string[] {
  const defined = new Set([...english.keys()].map(baseOf));
  const found = new Set([...usage.used].flatMap((key) => findDefined(key, defined)));
  const missing = [...usage.used].filter((key) => findDefined(key, defined).length === 0);
  return [
    ...usage.unreadable.map((place) => `${place}: the key cannot be told from its type`),
    ...missing.map((key) => `${key} is asked for and is not there`),
    ...[...defined].filter((key) => !found.has(key)).map((key) => `${key} is there and nobody asks for it`),
  ];
}

function findDefined(key: string, defined: Set<string>): string[] {
  if (key.includes(':')) return defined.has(key) ? [key] : [];
  return [...defined].filter((known) => known.slice(known.indexOf(':') + 1) === key);
}
