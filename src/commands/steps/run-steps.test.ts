import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { describe, expect, it } from 'vitest';

const runner = new URL('./run-steps.mjs', import.meta.url).href;
const passing = `{ name: 'first', run: async () => ({ passed: 3, failed: 0 }) }`;

/** Runs the steps in a process of their own: what is tested is how a process ends. */
function startSteps(...steps: string[]) {
  const program = `import { runSteps } from '${runner}'; await runSteps([${steps.join(', ')}]);`;
  return spawn(process.execPath, ['--input-type=module', '--eval', program]);
}

async function waitForEnd(child: ChildProcess, onText: (text: string) => void = () => {}) {
  let output = '';
  child.stdout?.on('data', (chunk) => {
    output += String(chunk);
    onText(output);
  });
  const [code] = await once(child, 'close');
  return { code, lastLine: output.trimEnd().split('\n').at(-1), output };
}

describe('runSteps ends with its counts', () => {
  it('and 0 when all passed', async () => {
    const end = await waitForEnd(startSteps(passing));
    expect(end).toMatchObject({ code: 0, lastLine: '3 passed, 0 failed' });
  });

  it.each([
    [
      'a step counted failures',
      `{ name: 'bad', run: async () => ({ passed: 1, failed: 2 }) }`,
      '4 passed, 2 failed',
    ],
    [
      'a step threw',
      `{ name: 'bad', run: async () => { throw new Error('broken'); } }`,
      '3 passed, 1 failed',
    ],
    ['a step waits for nothing', `{ name: 'bad', run: () => new Promise(() => {}) }`, '3 passed, 1 failed'],
    ['a step left the process', `{ name: 'bad', run: async () => process.exit(0) }`, '3 passed, 1 failed'],
    [
      'an error came from outside the step',
      `{ name: 'bad', run: () => new Promise(() => setTimeout(() => { throw new Error('stray'); })) }`,
      '3 passed, 1 failed',
    ],
    [
      'a promise was dropped',
      `{ name: 'bad', run: () => { Promise.reject(new Error('stray')); return new Promise(() => {}); } }`,
      '3 passed, 1 failed',
    ],
  ])('and 1 when %s', async (_case, step, lastLine) => {
    expect(await waitForEnd(startSteps(passing, step))).toMatchObject({
      code: 1,
      lastLine,
    });
  });

  it('and 1 when there was nothing to run', async () => {
    expect(await waitForEnd(startSteps())).toMatchObject({
      code: 1,
      lastLine: '0 passed, 1 failed',
    });
  });

  it('and leaves out the rest when an essential step failed', async () => {
    const essential = `{ name: 'base', essential: true, run: async () => ({ passed: 0, failed: 1 }) }`;
    const end = await waitForEnd(startSteps(essential, passing));
    expect(end).toMatchObject({ code: 1, lastLine: '0 passed, 1 failed' });
  });

  it('and counts steps that run side by side, also one that never ends', async () => {
    const meet = (name: string) =>
      `{ name: '${name}', run: async () => {
        globalThis.here = (globalThis.here ?? 0) + 1;
        while (globalThis.here < 2) await new Promise((done) => setTimeout(done, 5));
        return { passed: 1, failed: 0 };
      } }`;
    const lanes = `[[${meet('one')}], [${meet('other')}]]`;
    expect(await waitForEnd(startSteps(lanes, passing))).toMatchObject({
      code: 0,
      lastLine: '5 passed, 0 failed',
    });
    const stuck = `[[{ name: 'stuck', run: () => new Promise(() => {}) }], [${passing}]]`;
    const end = await waitForEnd(startSteps(stuck));
    expect(end).toMatchObject({ code: 1, lastLine: '3 passed, 1 failed' });
    expect(end.output).toContain('stuck did not come to its end');
  });

  it.each(['SIGINT', 'SIGTERM', 'SIGHUP'] as const)('and 1 on %s, its programs ended', async (signal) => {
    const child = startSteps(
      passing,
      `{ name: 'long', run: async () => {
        const { runChild } = await import('${new URL('../machine/child.mjs', import.meta.url).href}');
        const loop = 'console.log("pid " + process.pid); setInterval(() => {}, 1000)';
        await runChild({ command: process.execPath, args: ['--eval', loop], onText: (text) => console.log(text) });
        return { passed: 1, failed: 0 };
      } }`,
    );
    let isAsked = false;
    const end = await waitForEnd(child, (text) => {
      if (isAsked || !/pid \d+\s/.test(text)) return;
      isAsked = true;
      child.kill(signal);
    });
    expect(end).toMatchObject({ code: 1, lastLine: '3 passed, 1 failed' });
    const pid = Number(/pid (\d+)/.exec(end.output)?.[1]);
    expect(() => process.kill(pid, 0)).toThrow(/ESRCH/);
  });
});
