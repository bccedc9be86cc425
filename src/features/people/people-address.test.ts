import { describe, expect, it } from 'vitest';
import { peopleAddress, readPeopleList, sortedAddress } from './people-address.ts';

function read(query: string) {
  return readPeopleList(new URLSearchParams(query));
}

describe('the address of the list', () => {
  it('is short for the usual list and whole for any other', () => {
    expect(peopleAddress(read(''))).toBe('/people');
    const address = peopleAddress(read('search=Ana+R&show=not+asked'), 'place');
    expect(address).toBe('/people?search=Ana+R&show=not+asked&after=place');
    expect(read(address.split('?')[1] ?? '')).toMatchObject({
      search: 'Ana R',
      show: 'not asked',
      after: 'place',
    });
  });

  it('with nonsense in it shows the usual list', () => {
    expect(read('sort=password_hash&limit=9999&show=all&direction=up')).toEqual(read(''));
  });

  it('sorts by a column and turns round when pressed again', () => {
    const first = sortedAddress(read(''), 'language');
    expect(first).toBe('/people?sort=language');
    expect(sortedAddress(read('sort=language'), 'language')).toBe(
      '/people?sort=language&direction=descending',
    );
    expect(sortedAddress(read(''), 'name')).toBe('/people?direction=descending');
  });
});
