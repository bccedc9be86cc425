// @ts-check
// Bundles the plain Node programs, in a process of its own because Vite changes the environment of the one it runs in.
import { build } from 'vite';
import { inProject, projectFolder } from '../begin/project.mjs';

const programs = [
  { name: 'main', entry: 'src/main.ts' },
  { name: 'fakes', entry: 'src/fakes/main.ts' },
];

for (const { name, entry } of programs) {
  await build({
    root: projectFolder,
    configFile: false,
    publicDir: false,
    logLevel: 'warn',
    build: {
      ssr: inProject(entry),
      outDir: inProject('dist/main'),
      emptyOutDir: false,
      target: 'node20',
      rollupOptions: {
        output: {
          entryFileNames: `${name}.mjs`,
          chunkFileNames: `${name}-[name]-[hash].mjs`,
        },
      },
    },
  });
}
