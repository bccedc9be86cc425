import { importsOf, packageOf, resolveImport } from './imports.ts';
import { isBuiltIn } from './layer-faults.ts';
import { layerOf } from './layers.ts';
import type { Source } from './sources.ts';

const browserLayers = new Set(['ui', 'island', 'feature-island', 'feature-queries']);
const serverPackages = new Set([
  '@astrojs/node',
  '@node-rs/argon2',
  'better-sqlite3',
  'compression',
  'csv-parse',
  'knex',
  'lucia',
  'nodemailer',
  'pino',
  'rate-limiter-flexible',
  'sharp',
  'sirv',
  'twilio',
]);

/** Each island whose code would carry server code, or the words of all languages, into the browser; with the way there. */
export function findBrowserFaults(sources: Source[]): string[] {
  const byPath = new Map(sources.map((source) => [source.path, source]));
  const starts = sources.filter(
    ({ path }) => !path.endsWith('.astro') && browserLayers.has(layerOf(path)?.name ?? ''),
  );
  return starts.flatMap((start) => walkFrom(start, byPath));
}

function walkFrom(start: Source, byPath: Map<string, Source>): string[] {
  const faults: string[] = [];
  const seen = new Set([start.path]);
  const open: { source: Source; way: string }[] = [{ source: start, way: start.path }];
  for (const { source, way } of open) {
    const reason = explainUnfit(source);
    if (reason) faults.push(`${way}: ${reason}`);
    for (const { specifier, isTypeOnly } of importsOf(source)) {
      if (isTypeOnly) continue;
      const name = packageOf(specifier);
      if (isBuiltIn(name) || serverPackages.has(name)) faults.push(`${way}: imports "${specifier}"`);
      const target = byPath.get(resolveImport(source.path, specifier) ?? '');
      if (!target || seen.has(target.path)) continue;
      seen.add(target.path);
      open.push({ source: target, way: `${way} -> ${target.path}` });
    }
  }
  return faults;
}

function explainUnfit({ path, text }: Source): string | undefined {
  if (/import\.meta\.glob[^;]*locales\//s.test(text)) return 'holds the words of all languages';
  if (layerOf(path)?.name === 'server') return 'is server code';
  return undefined;
}
