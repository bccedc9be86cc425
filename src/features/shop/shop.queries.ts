import { queryOptions } from '@tanstack/react-query';
import { callServer } from '../../components/island/call-server.ts';
import { type ChangeShop, type PublicShop, publicShopSchema } from './shop.schema.ts';
import { type TextsCheck, textsCheckSchema } from './texts-check.schema.ts';

export function changeShopCall(body: ChangeShop): Promise<PublicShop> {
  return callServer('/api/shop', { method: 'PATCH', body, output: publicShopSchema });
}

const pollMilliseconds = 2_000;

/** How far the check has got; asked again every two seconds until every step is decided. */
export function textsCheckOptions(first: TextsCheck) {
  return queryOptions({
    queryKey: ['texts-check'],
    queryFn: () => callServer('/api/shop/texts-check', { output: textsCheckSchema }),
    initialData: first,
    refetchInterval: ({ state }) =>
      state.data?.startedAt !== null && !state.data?.isDone ? pollMilliseconds : false,
  });
}

export function startTextsCheckCall(): Promise<TextsCheck> {
  return callServer('/api/shop/texts-check', { method: 'POST', body: {}, output: textsCheckSchema });
}
