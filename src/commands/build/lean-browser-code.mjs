/**
 * The statistics core does nothing when it is read in, so a page carries only what it uses of it. Its door names everything, and the bundler would
 * else keep the tables and schemas of all of it for one small function.
 */
export const pureCore = {
  name: 'pure-core',
  transform: (_code, id) =>
    id.includes('/src/lib/doe/') && !id.endsWith('/zod.ts') ? { moduleSideEffects: false } : null,
};

const writers = /\/zod\/v4\/core\/(?:to-json-schema|json-schema-processors)\.js$/;
const exported = /^export (?:const|function) (\w+)/gm;
const renamed = /^export \{ \w+ as (\w+) \};/gm;

/**
 * zod hangs the writing of JSON Schema onto every schema it makes, so no bundler can leave it out: 6 kB of each page that checks what is typed. Only
 * the server writes JSON Schema; the browser gets the same names with nothing behind them.
 */
export const noSchemaWriter = {
  name: 'no-schema-writer',
  enforce: 'pre',
  transform(code, id, options) {
    if (options?.ssr || !writers.test(id)) return null;
    const names = [...code.matchAll(exported), ...code.matchAll(renamed)].map(([, name]) => name);
    const empty = names.map((name) =>
      name === 'process'
        ? 'const none = () => undefined; export { none as process };'
        : `export const ${name} = () => undefined;`,
    );
    return { code: empty.join('\n'), map: null };
  },
};
