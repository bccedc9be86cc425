import { describe, expect, it } from 'vitest';
import { listTrialsSchema } from '../../../src/features/trial/trial.schema.ts';
import { createTrial } from '../../../src/features/trial/trial.service.ts';
import { viewTrials } from '../../../src/features/trial/trials-page.service.ts';
import { database } from '../../../src/server/db/connection.ts';
import { newId } from '../../../src/server/ids.ts';
import { buildTrialShop } from './trial-fixture.ts';

const list = listTrialsSchema.parse({});

describe('the page of trials', () => {
  it('tells an empty shop from a search that finds nothing', async () => {
    const { scope, dana } = await buildTrialShop();
    expect(await viewTrials(scope, list, dana.personId)).toMatchObject({ trials: [], isEmpty: true });
    await createTrial(scope, { id: newId() }, dana);
    const found = await viewTrials(scope, { ...list, search: 'nowhere' }, dana.personId);
    expect(found).toMatchObject({ trials: [], isEmpty: false });
    expect((await viewTrials(scope, list, dana.personId)).trials).toHaveLength(1);
  });

  it('shows how one ended to whoever has none of their own yet, and only where one has ended', async () => {
    const { scope, dana, add } = await buildTrialShop();
    const lee = await add(['supervisor']);
    const id = newId();
    await createTrial(scope, { id }, dana);
    expect((await viewTrials(scope, list, lee.personId)).example).toBeNull();
    await database()('trials').where({ id }).update({ state: 'closed' });
    expect((await viewTrials(scope, list, lee.personId)).example?.id).toBe(id);
    expect((await viewTrials(scope, list, dana.personId)).example).toBeNull();
  });
});
