import { describe, expect, it } from 'vitest';
import type { QuestionName } from '../answers.schema.ts';
import { type AnswersSurroundings, createAnswersStore } from './answers-store.ts';
import type { KeptAnswer } from './kept-answers.ts';
import type { SaveOutcome, SaveRequest, StoredAnswer, StoredAnswers } from './stored-answers.ts';

/** A server, a browser and a clock by hand: what was sent waits until the test answers it. */
function surroundings(kept = new Map<QuestionName, KeptAnswer>()) {
  const open: { request: SaveRequest; answer: (outcome: SaveOutcome) => void }[] = [];
  const told: QuestionName[] = [];
  let timer: { milliseconds: number; work: () => void } | null = null;
  let saves = 0;
  const around: AnswersSurroundings = {
    send: (request) => new Promise((answer) => open.push({ request, answer })),
    newSave: () => `save ${++saves}`,
    keep: {
      read: () => new Map(kept),
      write: (question, answer) => void kept.set(question, answer),
      remove: (question) => void kept.delete(question),
    },
    tell: (question) => void told.push(question),
    soon: (work) => work(),
    later(milliseconds, work) {
      timer = { milliseconds, work };
      return () => {
        timer = null;
      };
    },
  };
  return {
    around,
    kept,
    told,
    open,
    /** Lets the pause pass; answers how long it was. */
    async pass(): Promise<number> {
      const due = timer;
      timer = null;
      due?.work();
      await new Promise((done) => setTimeout(done, 0));
      return due?.milliseconds ?? 0;
    },
    async answer(outcome: SaveOutcome): Promise<SaveRequest> {
      const next = open.shift();
      if (!next) throw new RangeError('answer: nothing was sent');
      next.answer(outcome);
      await new Promise((done) => setTimeout(done, 0));
      return next.request;
    },
  };
}

function stored(version: number, change: string, savedBy = 'Lee Abbott'): StoredAnswer {
  return { version, content: { change }, savedBy, savedAt: version * 1_000 };
}

function begin(first: StoredAnswers = {}, kept?: Map<QuestionName, KeptAnswer>) {
  const store = createAnswersStore(first);
  const world = surroundings(kept);
  store.start(world.around);
  const saving = () => store.getSnapshot().save.kind;
  return { store, saving, ...world };
}

const saved = (version: number): SaveOutcome => ({ kind: 'saved', version, savedAt: version * 1_000 });

describe('the answers of a page', () => {
  it('are shown and kept at once, and saved once after a pause', async () => {
    const { store, saving, kept, open, told, pass, answer } = begin();
    store.change('worth', { change: '3' });
    store.changeSoon('worth', { change: '3,5' });
    expect(store.getSnapshot().answers.worth).toEqual({ change: '3,5' });
    expect(kept.get('worth')).toEqual({ base: 0, content: { change: '3,5' } });
    expect(open).toEqual([]);
    expect(await pass()).toBe(600);
    expect(await answer(saved(1))).toEqual({
      question: 'worth',
      base: 0,
      content: { change: '3,5' },
      save: 'save 1',
    });
    expect(store.getSnapshot().save).toEqual({ kind: 'saved', at: 1_000 });
    expect(kept.size).toBe(0);
    expect(told).toEqual(['worth']);
    expect(saving()).toBe('saved');
  });

  it('build each save on the one before, and take no empty field for a change', async () => {
    const { store, open, pass, answer } = begin({ worth: stored(4, '3') });
    store.change('worth', { change: '3' });
    await pass();
    expect(open).toEqual([]);
    store.change('worth', { change: '4' });
    await pass();
    store.change('worth', { change: '5' });
    expect(await answer(saved(5))).toMatchObject({ base: 4, content: { change: '4' } });
    expect(await answer(saved(6))).toMatchObject({ base: 5, content: { change: '5' } });
    expect(store.getSnapshot().save).toEqual({ kind: 'saved', at: 6_000 });
  });

  it('wait for a connection, ask ever more seldom, and repeat the same save', async () => {
    const { store, saving, kept, pass, answer } = begin();
    store.change('worth', { change: '3' });
    await pass();
    await answer({ kind: 'offline' });
    expect(saving()).toBe('offline');
    expect(kept.has('worth')).toBe(true);
    expect(await pass()).toBe(1_000);
    await answer({ kind: 'offline' });
    expect(await pass()).toBe(2_000);
    expect(await answer(saved(1))).toMatchObject({ save: 'save 1' });
    expect(saving()).toBe('saved');
  });

  it('are there after a reload, and are sent then', async () => {
    const kept = new Map([['worth', { base: 2, content: { change: '7' } }]] as [QuestionName, KeptAnswer][]);
    const { store, pass, answer } = begin({ worth: stored(2, '3') }, kept);
    expect(store.getSnapshot().answers.worth).toEqual({ change: '7' });
    expect(await pass()).toBe(1_500);
    expect(await answer(saved(3))).toMatchObject({ base: 2, content: { change: '7' } });
    expect(kept.size).toBe(0);
  });

  it('do not take their own lost save for somebody else’s', async () => {
    const sent = { save: 'save 9', content: { change: '4' } };
    const kept = new Map([['worth', { base: 2, content: { change: '5' }, sent }]] as [
      QuestionName,
      KeptAnswer,
    ][]);
    const { store, pass, answer } = begin({ worth: stored(3, '4', 'Dana') }, kept);
    expect(store.getSnapshot().conflicts).toEqual([]);
    await pass();
    expect(await answer(saved(4))).toMatchObject({ base: 3, content: { change: '5' } });
  });

  it('show both texts where somebody else came first, and save neither unasked', async () => {
    const { store, pass, open, kept, answer } = begin({ worth: stored(1, '3') });
    store.change('worth', { change: '4' });
    await pass();
    const present = stored(2, '9');
    await answer({ kind: 'changed meanwhile', present });
    const [conflict] = store.getSnapshot().conflicts;
    expect(store.getSnapshot().save).toEqual({ kind: 'undecided' });
    expect(conflict).toEqual({ question: 'worth', mine: { change: '4' }, theirs: present });
    store.change('worth', { change: '4.5' });
    await pass();
    expect(open).toEqual([]);
    expect(kept.get('worth')).toMatchObject({ content: { change: '4.5' } });

    store.resolve('worth', 'mine');
    await pass();
    expect(await answer(saved(3))).toMatchObject({ base: 2, content: { change: '4.5' } });
    expect(store.getSnapshot().conflicts).toEqual([]);
  });

  it('give way to the other text when that is taken, and tell its form', async () => {
    const { store, pass, kept, answer } = begin({ worth: stored(1, '3') });
    const replaced: QuestionName[] = [];
    store.onReplaced((question) => replaced.push(question));
    store.change('worth', { change: '4' });
    await pass();
    await answer({ kind: 'changed meanwhile', present: stored(2, '9') });
    expect(replaced).toEqual([]);
    store.resolve('worth', 'theirs');
    expect(store.getSnapshot().answers.worth).toEqual({ change: '9' });
    expect(replaced).toEqual(['worth']);
    expect(kept.size).toBe(0);
  });

  it('hear of other tabs and other devices, but never lose what is being typed', () => {
    const { store } = begin({ worth: stored(1, '3'), value: { ...stored(1, ''), content: {} } });
    store.hearOtherTab('worth', stored(2, '6'));
    expect(store.getSnapshot().answers.worth).toEqual({ change: '6' });
    store.change('worth', { change: '8' });
    store.meet({ worth: stored(3, '7') });
    expect(store.getSnapshot().answers.worth).toEqual({ change: '8' });
    expect(store.getSnapshot().conflicts).toHaveLength(1);
    store.meet({ worth: stored(1, '3') });
    expect(store.getSnapshot().conflicts).toHaveLength(1);
  });

  it('are not sent again as they were refused, only once they change', async () => {
    const { store, saving, pass, open, answer } = begin();
    store.change('worth', { change: 'x'.repeat(300) });
    await pass();
    await answer({ kind: 'refused', sentence: 'Too long.' });
    expect(store.getSnapshot().save).toEqual({ kind: 'refused', sentence: 'Too long.' });
    await pass();
    expect(open).toEqual([]);
    store.change('worth', { change: '3' });
    await pass();
    await answer(saved(1));
    expect(saving()).toBe('saved');
  });

  it('go out as the page is left, without what is already under way', async () => {
    const { store, pass, open } = begin();
    store.change('worth', { change: '3' });
    await pass();
    store.change('value', { partsPerWeek: '100' });
    expect(open).toHaveLength(1);
    expect(store.leaving()).toMatchObject([{ question: 'value', content: { partsPerWeek: '100' } }]);
    store.change('worth', { change: '4' });
    expect(store.leaving().map(({ question }) => question)).toContain('worth');
  });

  it('save several questions one after the other', async () => {
    const { store, pass, open, answer } = begin();
    store.change('worth', { change: '3' });
    store.change('value', { partsPerWeek: '100' });
    await pass();
    expect(open).toHaveLength(1);
    await answer(saved(1));
    expect(open).toHaveLength(1);
    await answer(saved(1));
    expect(open).toHaveLength(0);
  });
});
