import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { explainWrongNode, wantedNode } from './node-version.mjs';
import { inProject } from './project.mjs';

describe('explainWrongNode', () => {
  it.each(['20.3.0', '20.20.2'])('accepts %s', (version) => {
    expect(explainWrongNode(version)).toBe('');
  });

  it.each(['0.12.18', '18.19.0', '20.2.0', '21.0.0', '22.4.1'])('names %s and what is wanted', (version) => {
    expect(explainWrongNode(version)).toBe(
      `Trywell runs on Node 20 (20.3 or newer), and this is Node ${version}.`,
    );
  });

  it('agrees with package.json and .nvmrc', () => {
    const { engines } = JSON.parse(readFileSync(inProject('package.json'), 'utf8'));
    expect(engines.node).toBe(`>=${wantedNode.major}.${wantedNode.minor} <${wantedNode.major + 1}`);
    expect(readFileSync(inProject('.nvmrc'), 'utf8').trim()).toBe(String(wantedNode.major));
  });
});
