import { describe, expect, it } from 'vitest';
import { localPath } from './local-path.ts';

describe('localPath', () => {
  it('keeps a path of ours with its query', () => {
    expect(localPath('/people?sort=name')).toBe('/people?sort=name');
  });

  it.each([
    null,
    undefined,
    '',
    'https://other.example/',
    '//other.example',
    '/\\other.example',
    '/\t/other.example',
    'javascript:alert(1)',
    'people',
  ])('sends %j to the front page', (wish) => {
    expect(localPath(wish)).toBe('/');
  });
});
