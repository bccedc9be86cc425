import { changeShopSchema, publicShopSchema } from '../../../features/shop/shop.schema.ts';
import { changeShop, readShop } from '../../../features/shop/shop.service.ts';
import { defineEndpoint } from '../../../server/http/define-endpoint.ts';

export const GET = defineEndpoint({ access: 'shop.manage', output: publicShopSchema }, ({ scope }) =>
  readShop(scope),
);

export const PATCH = defineEndpoint(
  { access: 'shop.manage', body: changeShopSchema, output: publicShopSchema },
  ({ scope, body }) => changeShop(scope, body),
);
