import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { explainedLongFiles, findLongFiles, longestFile } from './file-length.ts';
import { projectFolder, readSources } from './sources.ts';

describe('files are short', () => {
  it('or say why not', () => {
    expect(findLongFiles(readSources(), explainedLongFiles)).toEqual([]);
  });

  const long = { path: 'src/long.ts', text: 'a\n'.repeat(longestFile + 1) };

  it('and a long one without a reason is found', () => {
    expect(findLongFiles([long], {})).toEqual([`src/long.ts: ${longestFile + 1} lines`]);
    expect(findLongFiles([long], { 'src/long.ts': 'one table' })).toEqual([]);
  });

  it('and a reason that is no longer needed is found', () => {
    expect(findLongFiles([{ path: 'src/long.ts', text: 'a' }], { 'src/long.ts': 'one table' })).toHaveLength(
      1,
    );
  });
});

interface LockedPackage {
  resolved?: string;
  integrity?: string;
  /** Shipped inside another package, whose fingerprint covers it. */
  inBundle?: boolean;
}

/** Locked packages tied to one registry, and those whose content is not pinned. */
function findLockFaults(packages: Record<string, LockedPackage>): string[] {
  const faulty = Object.entries(packages).filter(([place, { resolved, integrity, inBundle }]) => {
    const isPinned = integrity !== undefined || inBundle === true;
    return place !== '' && (resolved !== undefined || !isPinned);
  });
  return faulty.map(([place]) => place);
}

/** Versions that are not exact. */
function findLooseVersions(dependencies: Record<string, string>): string[] {
  return Object.entries(dependencies).flatMap(([name, version]) =>
    /^\d+\.\d+\.\d+$/.test(version) ? [] : [name],
  );
}

describe('packages are pinned', () => {
  const lock = JSON.parse(readFileSync(`${projectFolder}package-lock.json`, 'utf8'));
  const { dependencies, devDependencies } = JSON.parse(readFileSync(`${projectFolder}package.json`, 'utf8'));

  it('by content and to no registry', () => {
    expect(Object.keys(lock.packages).length).toBeGreaterThan(100);
    expect(findLockFaults(lock.packages)).toEqual([]);
  });

  it('and a registry or a missing fingerprint is found', () => {
    const locked = {
      'node_modules/a': { resolved: 'https://registry.example/a.tgz', integrity: 'sha512-x' },
      'node_modules/b': {},
      'node_modules/c': { integrity: 'sha512-x' },
    };
    expect(findLockFaults(locked)).toEqual(['node_modules/a', 'node_modules/b']);
  });

  it('to exact versions', () => {
    expect(findLooseVersions({ ...dependencies, ...devDependencies })).toEqual([]);
    expect(findLooseVersions({ a: '^1.0.0', b: '1.0.0', c: 'latest' })).toEqual(['a', 'c']);
  });

  it('and the lock file knows what package.json asks for', () => {
    expect(lock.packages['']).toMatchObject({ dependencies, devDependencies });
  });
});
