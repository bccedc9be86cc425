import type { DescribedEndpoint } from './openapi.ts';

const methods = ['GET', 'POST', 'PUT', 'PATCH', 'DELETE'] as const;

/** The endpoints of the files under `pages/api` that declare who may call them and what they take and answer. */
export function listEndpoints(modules: Readonly<Record<string, unknown>>): DescribedEndpoint[] {
  return Object.entries(modules).flatMap(([file, module]) => {
    const path = `/api/${file.replace(/^.*pages\/api\/|^\.\//, '')}`
      .replace(/\.ts$/, '')
      .replace(/\/index$/, '');
    const exported = (module ?? {}) as Record<string, { declaration?: DescribedEndpoint['declaration'] }>;
    return methods.flatMap((method): DescribedEndpoint[] => {
      const declaration = exported[method]?.declaration;
      return declaration ? [{ method, path, declaration }] : [];
    });
  });
}
