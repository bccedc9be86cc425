import { expect, it } from 'vitest';
import { z } from 'zod';
import { writeJsonSchemas } from '../pack/json-schema.ts';
import { describeFields } from './describe-fields.ts';

const place = '#/components/schemas/';

it('names what an answer holds, two fields deep, with the types that JSON has', () => {
  const trial = z.object({
    number: z.number(),
    state: z.enum(['draft', 'running']),
    owner: z.object({ name: z.string(), home: z.object({ town: z.string() }) }).nullable(),
    runs: z.array(z.object({ values: z.array(z.number()) })),
    note: z.string().optional(),
  });
  const schemas = writeJsonSchemas({ Trials: z.object({ trials: z.array(trial) }) }, { io: 'input', place });
  expect(describeFields(schemas, schemas['Trials'])).toEqual([
    { name: 'trials', type: 'object[]', required: true },
    { name: 'trials.number', type: 'number', required: true },
    { name: 'trials.state', type: '"draft" | "running"', required: true },
    { name: 'trials.owner', type: 'object | null', required: true },
    { name: 'trials.runs', type: 'object[]', required: true },
    { name: 'trials.note', type: 'string', required: false },
  ]);
});

it('shows nothing for what is no object', () => {
  expect(describeFields({}, undefined)).toEqual([]);
  expect(describeFields({}, { type: 'string' })).toEqual([]);
});
