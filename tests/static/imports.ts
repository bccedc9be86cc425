import { posix } from 'node:path';
import ts from 'typescript';
import { parseSource, type Source, walk } from './sources.ts';

export interface Import {
  specifier: string;
  /** `import type` leaves no trace in what runs. */
  isTypeOnly: boolean;
}

/** What a file imports or exports from elsewhere, dynamic imports and import types among it. */
export function importsOf(source: Source): Import[] {
  return walk(parseSource(source)).flatMap((node): Import[] => {
    if (ts.isImportDeclaration(node) && ts.isStringLiteral(node.moduleSpecifier))
      return [{ specifier: node.moduleSpecifier.text, isTypeOnly: node.importClause?.isTypeOnly ?? false }];
    if (ts.isExportDeclaration(node) && node.moduleSpecifier && ts.isStringLiteral(node.moduleSpecifier))
      return [{ specifier: node.moduleSpecifier.text, isTypeOnly: node.isTypeOnly }];
    if (
      ts.isImportTypeNode(node) &&
      ts.isLiteralTypeNode(node.argument) &&
      ts.isStringLiteral(node.argument.literal)
    )
      return [{ specifier: node.argument.literal.text, isTypeOnly: true }];
    if (isImportCall(node)) return [{ specifier: node.arguments[0].text, isTypeOnly: false }];
    return [];
  });
}

function isImportCall(node: ts.Node): node is ts.CallExpression & { arguments: [ts.StringLiteralLike] } {
  if (!ts.isCallExpression(node)) return false;
  const [first] = node.arguments;
  const isImport =
    node.expression.kind === ts.SyntaxKind.ImportKeyword ||
    (ts.isIdentifier(node.expression) && node.expression.text === 'require');
  return isImport && first !== undefined && ts.isStringLiteralLike(first);
}

/** The path in the project that a relative import leads to; nothing for a package or a built-in module. */
export function resolveImport(from: string, specifier: string): string | undefined {
  if (!specifier.startsWith('.')) return undefined;
  return posix.join(posix.dirname(from), specifier.replace(/\?.*$/, ''));
}

/** `@scope/name/part` and `name/part` without the part; `node:` and `astro:` names stay whole. */
export function packageOf(specifier: string): string {
  if (specifier.includes(':')) return specifier;
  const parts = specifier.split('/');
  return specifier.startsWith('@') ? parts.slice(0, 2).join('/') : (parts[0] ?? '');
}
