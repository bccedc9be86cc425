import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { createInterface } from 'node:readline';

const patience = 30_000;

export interface ChildProgram {
  process: ChildProcess;
  /** What the program said in its READY line. */
  ready: Record<string, unknown>;
  /** All that it wrote to standard error so far. */
  errors(): string;
  /** Ends it by SIGTERM and answers its exit code. */
  stop(): Promise<number | null>;
}

/** Starts a built program of `dist/main` and waits for its READY line. */
export async function startProgram(file: string, env: Record<string, string>): Promise<ChildProgram> {
  const inherited = Object.fromEntries(
    ['PATH', 'HOME', 'TMPDIR'].map((name) => [name, process.env[name] ?? '']),
  );
  const child = spawn(process.execPath, [file], {
    env: { ...inherited, NODE_ENV: 'production', ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let errors = '';
  child.stderr.on('data', (chunk) => {
    errors += String(chunk);
  });
  const ready = await new Promise<Record<string, unknown>>((resolve, reject) => {
    const timer = setTimeout(() => reject(new Error(`${file} was not ready in time.\n${errors}`)), patience);
    child.once('exit', (code) => reject(new Error(`${file} ended with ${code}.\n${errors}`)));
    createInterface({ input: child.stdout }).on('line', (line) => {
      if (!line.startsWith('READY ')) return;
      clearTimeout(timer);
      resolve(JSON.parse(line.slice('READY '.length)));
    });
  });
  return {
    process: child,
    ready,
    errors: () => errors,
    async stop() {
      if (child.exitCode !== null) return child.exitCode;
      child.kill('SIGTERM');
      await once(child, 'exit');
      return child.exitCode;
    },
  };
}
