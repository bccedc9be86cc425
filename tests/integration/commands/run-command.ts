import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { fileURLToPath } from 'node:url';

export const projectFolder = fileURLToPath(new URL('../../..', import.meta.url));

export interface CommandWishes {
  /** The project that the command belongs to; this one unless told. */
  folder?: string;
  args?: string[];
  /** Added to an environment with nothing but PATH and HOME; an empty text takes a variable away. */
  env?: Record<string, string>;
  /** Options of Node itself. */
  nodeOptions?: string[];
}

export interface CommandEnd {
  code: number | null;
  output: string;
  errors: string;
}

export interface StartedCommand {
  process: ChildProcess;
  output(): string;
  /** Waits until the output holds a text; the command's early end is an error. */
  waitFor(text: string): Promise<void>;
  ended: Promise<CommandEnd>;
}

/** Starts one of `src/commands/*.mjs`. */
export function startCommand(name: string, wishes: CommandWishes = {}): StartedCommand {
  const { folder = projectFolder, args = [], env = {}, nodeOptions = [] } = wishes;
  const child = spawn(process.execPath, [...nodeOptions, `src/commands/${name}.mjs`, ...args], {
    cwd: folder,
    env: { PATH: process.env['PATH'] ?? '', HOME: process.env['HOME'] ?? '', ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let output = '';
  let errors = '';
  const listeners = new Set<() => void>();
  child.stdout.on('data', (chunk) => {
    output += String(chunk);
    for (const listener of listeners) listener();
  });
  child.stderr.on('data', (chunk) => {
    errors += String(chunk);
  });
  const ended = once(child, 'close').then(([code]): CommandEnd => ({ code, output, errors }));
  const heard = (text: string) =>
    new Promise<void>((resolve) => {
      const listener = () => {
        if (output.includes(text)) resolve();
      };
      listeners.add(listener);
      listener();
    });
  return {
    process: child,
    output: () => output,
    ended,
    async waitFor(text) {
      const first = await Promise.race([heard(text), ended]);
      if (first)
        throw new Error(`${name} ended with ${first.code} before "${text}".\n${first.output}${first.errors}`);
    },
  };
}

/** Runs one of the commands to its end. */
export function runCommand(name: string, wishes: CommandWishes = {}): Promise<CommandEnd> {
  return startCommand(name, wishes).ended;
}
