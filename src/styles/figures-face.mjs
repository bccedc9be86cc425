import { mkdir, readFile, stat, writeFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import subsetFont from 'subset-font';

const GLYPHS = '0123456789,.+-\u2212';
/** Weight of the face to weight of the source: beside Lexend's 400 only Plex's 500 looks equally dark. */
const WEIGHTS = { 400: 500, 600: 600 };
const FOLDER = new URL('../../.astro/figures/', import.meta.url);
const resolve = createRequire(import.meta.url).resolve;

async function isPresent(file) {
  return stat(file).then(
    (found) => found.size > 0,
    () => false,
  );
}

/**
 * Cuts the digits, comma, point, plus and minus out of IBM Plex Sans (SIL Open Font License 1.1) into
 * `.astro/figures/figures-<weight>.woff2`, unless the file is there already. Needs no network: the font comes from node_modules.
 */
export async function writeFiguresFace() {
  await mkdir(FOLDER, { recursive: true });
  for (const [weight, sourceWeight] of Object.entries(WEIGHTS)) {
    const target = new URL(`figures-${weight}.woff2`, FOLDER);
    if (await isPresent(target)) continue;
    const source = await readFile(
      resolve(`@fontsource/ibm-plex-sans/files/ibm-plex-sans-latin-${sourceWeight}-normal.woff2`),
    );
    await writeFile(
      target,
      await subsetFont(source, GLYPHS, { targetFormat: 'woff2', noLayoutClosure: true }),
    );
  }
}

/**
 * The Vite plugin: the face must lie on disk before the first style sheet that names it is read, and it must stay a file,
 * because the content policy refuses fonts that are written into a style sheet.
 */
export function figuresFace() {
  return {
    name: 'trywell-figures-face',
    enforce: 'pre',
    config: () => ({
      build: { assetsInlineLimit: (file) => (file.endsWith('.woff2') ? false : undefined) },
    }),
    configResolved: writeFiguresFace,
  };
}
