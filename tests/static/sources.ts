import { readdirSync, readFileSync } from 'node:fs';
import { extname, join } from 'node:path';
import { convertToTSX } from '@astrojs/compiler/sync';
import ts from 'typescript';

/** A file of the project, its path from the project's folder with forward slashes. */
export interface Source {
  path: string;
  text: string;
}

export const projectFolder = new URL('../..', import.meta.url).pathname;

const unreadFolders = new Set([
  'node_modules',
  'dist',
  'data',
  'shots',
  'coverage',
  'tests/fixtures',
  'tests/reports',
]);
const codeEndings = new Set(['.ts', '.tsx', '.mjs', '.astro']);

/** Every TypeScript, JavaScript and Astro file of the project, as it lies on the disk. */
export function readSources(): Source[] {
  return listFiles('')
    .filter((path) => codeEndings.has(extname(path)))
    .map((path) => ({ path, text: readFileSync(join(projectFolder, path), 'utf8') }));
}

function listFiles(folder: string): string[] {
  return readdirSync(join(projectFolder, folder), { withFileTypes: true }).flatMap((entry) => {
    const path = folder === '' ? entry.name : `${folder}/${entry.name}`;
    if (entry.name.startsWith('.') || unreadFolders.has(path)) return [];
    return entry.isDirectory() ? listFiles(path) : [path];
  });
}

const trees = new WeakMap<Source, ts.SourceFile>();

/** The syntax tree of a file; an Astro file is read as the TSX its own compiler makes of it. */
export function parseSource(source: Source): ts.SourceFile {
  const known = trees.get(source);
  if (known) return known;
  const isAstro = source.path.endsWith('.astro');
  const text = isAstro ? tsxOfAstro(source) : source.text;
  const kind = isAstro || source.path.endsWith('.tsx') ? ts.ScriptKind.TSX : ts.ScriptKind.TS;
  const tree = ts.createSourceFile(source.path, text, ts.ScriptTarget.Latest, true, kind);
  trees.set(source, tree);
  return tree;
}

function tsxOfAstro({ path, text }: Source): string {
  return convertToTSX(text, { filename: path, includeScripts: true, includeStyles: false }).code;
}

const listed = new WeakMap<ts.Node, ts.Node[]>();

/** All nodes of a tree, parents before children. Several rules walk the same trees, so a list is kept. */
export function walk(node: ts.Node): readonly ts.Node[] {
  const known = listed.get(node);
  if (known) return known;
  const nodes: ts.Node[] = [];
  const visit = (each: ts.Node): void => {
    nodes.push(each);
    ts.forEachChild(each, visit);
  };
  visit(node);
  listed.set(node, nodes);
  return nodes;
}

/** Where a node stands, as `path:line`. The line of an Astro file may be off by one. */
export function placeOf(source: Source, node: ts.Node): string {
  const tree = parseSource(source);
  return `${source.path}:${tree.getLineAndCharacterOfPosition(node.getStart(tree)).line + 1}`;
}
