import { type Answer, type Ask, jsonAnswer, type Route } from '../http/answer.ts';
import type { FakesSettings } from '../settings.ts';
import { errorAnswer, isSignedIn } from './api-routes.ts';
import { mediaPath, type TextService } from './text-service.ts';

const text = '/2010-04-01/Accounts/([^/]+)/Messages/(SM[0-9a-f]{32})';

/**
 * The pictures of texts, as the service hands them out: a list by text, and each picture by way of a store that is no
 * longer to be shown the account's key.
 */
export function mediaRoutes(settings: FakesSettings, service: TextService): Route[] {
  const { accountSid } = settings;
  const guarded =
    (handle: (ask: Ask) => Answer): Route['handle'] =>
    (ask) =>
      isSignedIn(ask, settings) ? handle(ask) : errorAnswer(401, 20_003, 'Account and token do not match.');

  const list = ({ parts, url }: Ask): Answer => {
    const found = service.state.texts.find(({ sid }) => sid === parts[1]);
    const media = (found?.media ?? []).map(({ sid, type }) => ({
      sid,
      account_sid: accountSid,
      parent_sid: found?.sid,
      content_type: type,
      date_created: new Date(found?.createdAt ?? 0).toUTCString(),
      date_updated: new Date(found?.createdAt ?? 0).toUTCString(),
      uri: `${mediaPath(accountSid, found?.sid ?? '', sid)}.json`,
    }));
    return jsonAnswer({
      media_list: media,
      ...{ page: 0, page_size: 50, start: 0, end: media.length - 1 },
      ...{ uri: url.pathname, first_page_uri: url.pathname, next_page_uri: null, previous_page_uri: null },
    });
  };

  const show = ({ parts, headers }: Ask): Answer => {
    if (headers.authorization !== undefined) {
      return jsonAnswer({ message: 'The store must not be shown the key.' }, 400);
    }
    const picture = service.pictureOf(parts[0] ?? '');
    if (picture === undefined) return jsonAnswer({ message: 'There is no such picture.' }, 404);
    return { status: 200, type: picture.type, body: picture.bytes };
  };

  const route = (path: string, handle: Route['handle']): Route => ({
    method: 'GET',
    path: new RegExp(path),
    caller: 'program',
    handle,
  });
  return [
    route(`^${text}/Media\\.json$`, guarded(list)),
    route(
      `^${text}/Media/(ME[0-9a-f]{32})$`,
      guarded(({ parts }) => ({
        status: 307,
        type: 'text/plain',
        body: '',
        headers: { location: `/media-store/${parts[2]}` },
      })),
    ),
    route('^/media-store/(ME[0-9a-f]{32})$', show),
  ];
}
