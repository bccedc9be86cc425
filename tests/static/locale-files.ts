import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { projectFolder } from './sources.ts';

/** The words of one language: `namespace:key.part` to what the reader sees. */
export type Words = Map<string, string>;

/** All words of the product by language, as they lie in `locales/`. */
export function readLocales(): Map<string, Words> {
  const folder = join(projectFolder, 'locales');
  return new Map(readdirSync(folder).map((language) => [language, readLanguage(join(folder, language))]));
}

function readLanguage(folder: string): Words {
  const files = readdirSync(folder).filter((name) => name.endsWith('.json'));
  return new Map(
    files.flatMap((name) => {
      const content: unknown = JSON.parse(readFileSync(join(folder, name), 'utf8'));
      return flatten(`${name.replace(/\.json$/, '')}:`, content);
    }),
  );
}

/** The leaves of a nested object of words, with their keys. */
export function flatten(prefix: string, value: unknown): [string, string][] {
  if (typeof value === 'string') return [[prefix, value]];
  if (typeof value !== 'object' || value === null || Array.isArray(value))
    throw new RangeError(`flatten: ${prefix} is neither words nor an object of words`);
  const separator = prefix.endsWith(':') || prefix === '' ? '' : '.';
  return Object.entries(value).flatMap(([key, inner]) => flatten(`${prefix}${separator}${key}`, inner));
}

const pluralEnding = /_(?:ordinal_)?(zero|one|two|few|many|other)$/;

/** A key without its plural ending: `runs_one` and `runs_other` are two forms of `runs`. */
export function baseOf(key: string): string {
  return key.replace(pluralEnding, '');
}

/** The plural category that a key is for, if it is a plural form. */
export function categoryOf(key: string): string | undefined {
  return pluralEnding.exec(key)?.[1];
}

/** The names between double braces, the tags, and the keys nested by `$t(…)`, each once and in order. */
export function placeholdersOf(text: string): string[] {
  const braces = [...text.matchAll(/\{\{-?\s*([\w.]+)[^}]*\}\}/g)].map((match) => `{{${match[1]}}}`);
  const others = [...text.matchAll(/<\/?\w+\s*\/?>|\$t\([^)]*\)/g)].map((match) => match[0]);
  return [...new Set([...braces, ...others])].sort();
}
