import { writeFileSync } from 'node:fs';
import { cpus, loadavg } from 'node:os';

/** What the figures were taken on, and how busy it was besides: a busy machine is a slow one. */
export function describeMachine(): string {
  const load = loadavg()[0] ?? 0;
  return `${cpus().length} cores, Node ${process.version}, load ${load.toFixed(1)} when it began.`;
}

/** Writes a report to tests/reports. */
export function report(name: string, title: string, paragraphs: readonly string[]): void {
  const file = new URL(`../../reports/${name}.md`, import.meta.url);
  writeFileSync(file, `# ${title}\n\n${paragraphs.join('\n\n')}\n`);
  console.log(`tests/reports/${name}.md`);
}
