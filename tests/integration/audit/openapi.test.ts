import type { APIContext } from 'astro';
import { beforeAll, describe, expect, it } from 'vitest';
import { listEndpoints } from '../../../src/features/audit/api/list-endpoints.ts';
import { writeOpenApi } from '../../../src/features/audit/api/openapi.ts';
import { writeTrialFileSchema } from '../../../src/features/audit/pack/json-schema.ts';
import { formatsFor } from '../../../src/i18n/format.ts';
import { translatorFor } from '../../../src/i18n/translator.ts';
import { createApiToken } from '../../../src/server/auth/api-tokens.ts';
import { recogniseViewer } from '../../../src/server/auth/recognise-viewer.ts';
import { AppError } from '../../../src/server/errors.ts';
import type { Endpoint } from '../../../src/server/http/define-endpoint.ts';
import { buildJudgedTrial, buildStand, type Stand } from './audit-fixture.ts';

const modules = import.meta.glob<Record<string, Endpoint>>('../../../src/pages/api/**/*.ts', { eager: true });
const t = translatorFor('en');
const endpoints = listEndpoints(modules);
const document = writeOpenApi(endpoints, { t, server: 'http://127.0.0.1' });

/** Every `$ref` in a document. */
function refsIn(value: unknown): string[] {
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, inner]) =>
    key === '$ref' && typeof inner === 'string' ? [inner] : refsIn(inner),
  );
}

function resolve(root: unknown, ref: string): unknown {
  const steps = ref.replace(/^#\//, '').split('/');
  // A walk through plain JSON.
  return steps.reduce((at, step) => (at as Record<string, unknown> | undefined)?.[step], root);
}

describe('the OpenAPI document', () => {
  it('has every endpoint file in it', () => {
    const files = Object.keys(modules).filter((file) => !file.includes('[...path]'));
    expect(files.length).toBeGreaterThan(30);
    const written = new Set(Object.keys(document.paths));
    const missing = files
      .map((file) =>
        file
          .slice(file.indexOf('/api/'))
          .replace(/\.ts$/, '')
          .replace(/\/index$/, ''),
      )
      .map((path) => path.replace(/\[(\w+)\]/g, '{$1}'))
      .filter((path) => !written.has(path));
    expect(missing).toEqual([]);
  });

  it('keeps to the structure of OpenAPI 3.1', () => {
    expect(document.openapi).toMatch(/^3\.1\.\d+$/);
    expect(document.info).toMatchObject({ title: expect.any(String), version: expect.any(String) });
    const names = new Set<string>();
    for (const [path, operations] of Object.entries(document.paths)) {
      expect(path).toMatch(/^\/api(\/[\w.{}-]+)+$/);
      for (const [method, operation] of Object.entries(operations)) {
        expect(['get', 'post', 'put', 'patch', 'delete']).toContain(method);
        const {
          operationId,
          responses,
          parameters = [],
        } = operation as {
          operationId: string;
          responses: Record<string, { description: string }>;
          parameters?: { name: string; in: string; required: boolean; schema: unknown }[];
        };
        expect(names.has(operationId)).toBe(false);
        names.add(operationId);
        expect(Object.keys(responses)).toContain('default');
        for (const answer of Object.values(responses)) expect(answer.description).toBeTruthy();
        const inPath = [...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => name);
        const named = parameters
          .filter((each) => each.in === 'path' && each.required)
          .map(({ name }) => name);
        expect({ path, method, named: named.sort() }).toEqual({ path, method, named: inPath.sort() });
      }
    }
  });

  it('points nowhere that is not there, and stays small', () => {
    for (const root of [document, writeTrialFileSchema()]) {
      const refs = refsIn(root);
      expect(refs.length).toBeGreaterThan(10);
      expect(refs.filter((ref) => resolve(root, ref) === undefined)).toEqual([]);
      expect(JSON.stringify(root).length).toBeLessThan(1_000_000);
    }
  });
});

describe('a personal token', () => {
  let stand: Stand;
  let trialId: string;
  let token: string;

  const contextOf = (path: string, method = 'GET') => {
    const url = new URL(path, 'http://127.0.0.1');
    const request = new Request(url, { method, headers: { Authorization: `Bearer ${token}` } });
    return { url, request, params: { id: trialId }, locals: {} } as unknown as APIContext;
  };

  async function call(path: string, pattern: string): Promise<Response> {
    const context = contextOf(path);
    const viewer = await recogniseViewer(context);
    Object.assign(context.locals, {
      viewer,
      t,
      language: 'en',
      formats: formatsFor('en', 'UTC'),
      requestId: 'x',
    });
    const module = modules[`../../../src/pages/api/${pattern}.ts`];
    if (!module?.['GET']) throw new Error(`no endpoint ${pattern}`);
    return module['GET'](context);
  }

  beforeAll(async () => {
    stand = await buildStand();
    trialId = await buildJudgedTrial(stand);
    ({ token } = await createApiToken(stand.scope, { personId: stand.reader.personId, name: 'Plant data' }));
  });

  it.each([
    ['', 'trials/index'],
    ['/verdict', 'trials/[id]/verdict'],
    ['/audit', 'trials/[id]/audit'],
    ['/board', 'trials/[id]/board'],
    ['/trial.json', 'trials/[id]/trial.json'],
  ])('reads /api/trials/…%s, which answers as it declares', async (part, pattern) => {
    const answer = await call(part === '' ? '/api/trials' : `/api/trials/${trialId}${part}`, pattern);
    expect(answer.status).toBe(200);
    const declared = modules[`../../../src/pages/api/${pattern}.ts`]?.['GET']?.declaration.output;
    const parsed = declared?.safeParse(await answer.json());
    expect(parsed?.error?.issues ?? []).toEqual([]);
    expect(parsed?.success).toBe(true);
  });

  it('fetches the pack and the document', async () => {
    const pack = await call(`/api/trials/${trialId}/pack`, 'trials/[id]/pack');
    expect(pack.headers.get('content-type')).toBe('application/zip');
    expect(new Uint8Array(await pack.arrayBuffer()).slice(0, 2)).toEqual(new Uint8Array([0x50, 0x4b]));
    expect((await call('/api/openapi.json', 'openapi.json')).status).toBe(200);
  });

  it('is known by when it was last used, changes nothing, and rests after 120 calls a minute', async () => {
    const [row] = await stand.scope.db('api_tokens').where({ shop_id: stand.scope.shopId });
    expect(Number(row.last_used_at)).toBeGreaterThan(0);
    const codeOf = (work: Promise<unknown>) =>
      work.then(
        () => 'none',
        (error: unknown) => (error instanceof AppError ? error.code : String(error)),
      );
    expect(await codeOf(recogniseViewer(contextOf('/api/trials/import', 'POST')))).toBe('forbidden');
    const codes = new Set<string>();
    for (let tries = 0; tries < 121; tries += 1)
      codes.add(await codeOf(recogniseViewer(contextOf('/api/trials'))));
    expect([...codes]).toEqual(['none', 'too-many']);
  });
});
