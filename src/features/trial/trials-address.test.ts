import { describe, expect, it } from 'vitest';
import { readTrialsList, sortedTrialsAddress, trialsAddress } from './trials-address.ts';

const listOf = (query: string) => readTrialsList(new URLSearchParams(query));

describe('the address of the trials list', () => {
  it('says only what is unusual, and is read back', () => {
    expect(trialsAddress(listOf(''))).toBe('/trials');
    const query = 'search=seal&state=running&show=away&sort=title&direction=ascending';
    expect(trialsAddress(listOf(query))).toBe(`/trials?${query}`);
    expect(trialsAddress(listOf('state=closed'), 'here')).toBe('/trials?state=closed&after=here');
  });

  it('takes what cannot be read for the usual', () => {
    expect(listOf('state=lost&sort=price&direction=up&limit=many')).toEqual(listOf(''));
  });

  it('sorts names from A and the rest from the newest, and turns round when pressed again', () => {
    expect(sortedTrialsAddress(listOf(''), 'title')).toBe('/trials?sort=title&direction=ascending');
    expect(sortedTrialsAddress(listOf('sort=title&direction=ascending'), 'title')).toBe('/trials?sort=title');
    expect(sortedTrialsAddress(listOf('sort=title&direction=ascending'), 'number')).toBe(
      '/trials?sort=number',
    );
  });
});
