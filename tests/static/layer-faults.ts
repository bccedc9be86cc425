import { builtinModules } from 'node:module';
import { extname } from 'node:path';
import { importsOf, packageOf, resolveImport } from './imports.ts';
import { type Layer, layerOf } from './layers.ts';
import type { Source } from './sources.ts';

export interface KnownPackages {
  dependencies: ReadonlySet<string>;
  devDependencies: ReadonlySet<string>;
}

/** Each import that goes against the arrows, lacks its extension, or names a package that is not there for it. */
export function findLayerFaults(sources: Source[], packages: KnownPackages): string[] {
  return sources.flatMap((source) => {
    const layer = layerOf(source.path);
    if (!layer) return [`${source.path}: no layer has a place for this file`];
    return importsOf(source).flatMap(({ specifier, isTypeOnly }) => {
      const target = resolveImport(source.path, specifier);
      const fault = target
        ? explainRelative(layer, source.path, target)
        : explainPackage({ layer, path: source.path, specifier, isTypeOnly, packages });
      return fault ? [`${source.path}: ${fault}`] : [];
    });
  });
}

function explainRelative(layer: Layer, from: string, target: string): string | undefined {
  if (extname(target) === '') return `"${target}" is imported without its extension`;
  if (isPlainCommand(from) && layerOf(target)?.name !== 'commands')
    return `a command in plain JavaScript imports "${target}", which is not one`;
  const targetLayer = layerOf(target);
  if (!targetLayer || layer.mayImport.includes('*')) return undefined;
  if (targetLayer.name === layer.name || layer.mayImport.includes(targetLayer.name)) return undefined;
  return `${layer.name} may not import ${targetLayer.name} ("${target}")`;
}

function isPlainCommand(path: string): boolean {
  return path.startsWith('src/commands/') && path.endsWith('.mjs');
}

interface PackageImport {
  layer: Layer;
  path: string;
  specifier: string;
  isTypeOnly: boolean;
  packages: KnownPackages;
}

function explainPackage({ layer, path, specifier, isTypeOnly, packages }: PackageImport): string | undefined {
  const name = packageOf(specifier);
  if (/^[@~#]\//.test(specifier) || specifier.startsWith('/') || specifier.startsWith('src/'))
    return `"${specifier}" is an alias: imports are relative`;
  if (name.startsWith('astro:'))
    return layer.underAstro ? undefined : `"${specifier}" exists only under Astro`;
  if (layer.packages && !layer.packages.includes(name))
    return `${layer.name} may not import the package "${name}"`;
  if (isBuiltIn(name)) return undefined;
  if (name === 'astro' && !isTypeOnly && !layer.underAstro) return `"${specifier}" runs only under Astro`;
  if (packages.dependencies.has(name)) return undefined;
  if (!packages.devDependencies.has(name) && !packages.devDependencies.has(`@types/${name}`))
    return `package.json does not name "${name}"`;
  if (layer.forDevelopment || isTypeOnly || path.endsWith('.d.ts')) return undefined;
  return `"${name}" is a development package, and ${layer.name} is part of the product`;
}

export function isBuiltIn(name: string): boolean {
  return name.startsWith('node:') || builtinModules.includes(name);
}
