import { cpSync, mkdtempSync, rmSync, symlinkSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { basename, join } from 'node:path';
import { projectFolder } from './run-command.ts';

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
    filter: (path) => path === projectFolder || !leftOut.has(basename(path)),
  });
  if (withPackages) symlinkSync(join(projectFolder, 'node_modules'), join(folder, 'node_modules'));
  return { folder, remove: () => rmSync(join(folder, '..'), { recursive: true, force: true }) };
}
