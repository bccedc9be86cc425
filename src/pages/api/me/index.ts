import { changeProfileSchema, profileSchema } from '../../../features/people/profile.schema.ts';
import { changeOwnProfile } from '../../../features/people/profile.service.ts';
import { defineEndpoint } from '../../../server/http/define-endpoint.ts';

export const PATCH = defineEndpoint(
  { access: 'signed-in', body: changeProfileSchema, output: profileSchema },
  ({ scope, viewer, body }) => changeOwnProfile(scope, viewer, body),
);
