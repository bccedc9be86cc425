// Read by any Node that knows modules, however old: no syntax newer than 2018, no `node:` prefix, no top-level await.
// @ts-check

/** The release line the product is built and tested on, and the oldest release of it that has all we use. */
export const wantedNode = { major: 20, minor: 3 };

/**
 * Says why this Node cannot run the product, or nothing when it can.
 * @param {string} version as in `process.versions.node`
 * @returns {string} one sentence, or ''
 */
export function explainWrongNode(version) {
  const parts = version.split('.');
  if (Number(parts[0]) === wantedNode.major && Number(parts[1]) >= wantedNode.minor) return '';
  const wanted = `${wantedNode.major}.${wantedNode.minor}`;
  return (
    'Trywell runs on Node ' +
    wantedNode.major +
    ' (' +
    wanted +
    ' or newer), and this is Node ' +
    version +
    '.'
  );
}

/**
 * Runs `load` on a Node that can, else says why not on stderr and leaves with exit code 1.
 * @param {() => Promise<unknown>} load imports the real command, which may use newer syntax
 * @param {string} [lastWords] a line for stdout when nothing could be run
 */
export function begin(load, lastWords) {
  const reason = explainWrongNode(process.versions.node);
  if (reason === '') {
    load();
    return;
  }
  process.exitCode = 1;
  process.stderr.write(`${reason}\n`);
  if (lastWords) process.stdout.write(`${lastWords}\n`);
}
