import { cpSync, mkdtempSync, rmSync, symlinkSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, relative } from 'node:path';
import { projectFolder } from './run-command.ts';

/** From the project's folder; a folder of sources may have such a name too. */
const leftOut = new Set(['.git', '.astro', 'node_modules', 'dist', 'data', 'shots', 'coverage']);

export interface FreshClone {
  folder: string;
  remove(): void;
}

/** A copy of the sources alone, as a fresh clone has them: nothing built, no data. */
export function makeFreshClone({ withPackages }: { withPackages: boolean }): FreshClone {
  const folder = join(mkdtempSync(join(tmpdir(), 'trywell-clone-')), 'trywell');
  cpSync(projectFolder, folder, {
    recursive: true,
    filter: (path) => !leftOut.has(relative(projectFolder, path)),
  });
  if (withPackages) symlinkSync(join(projectFolder, 'node_modules'), join(folder, 'node_modules'));
  return { folder, remove: () => rmSync(join(folder, '..'), { recursive: true, force: true }) };
}
