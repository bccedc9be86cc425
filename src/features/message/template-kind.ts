import type { z } from 'zod';
import type { Translate } from '../../i18n/translator.ts';
import type { Channel } from './message.ts';

export interface Words {
  /** Mails only. */
  subject?: string;
  body: string;
}

/** What is common to all messages of one kind. */
export interface Template {
  channel: Channel;
  /** Rises when the words change what they say; kept with each message, and with the consent that was given to them. */
  version: number;
  /**
   * Whom it may go to: `agreed` to people who said OK; `asked` only to somebody who is being asked; `anyone` needs no
   * consent (mail).
   */
  audience: 'agreed' | 'asked' | 'anyone';
  /** It answers a text the person has just sent, so it may go out when that text came outside the work hours. */
  answersText: boolean;
  /** Its words open a door (a link with a secret): they are blanked once they are out. */
  holdsSecret: boolean;
  /** Writes it. @throws ZodError when the parameters are not its own */
  write(t: Translate, params: unknown): Words;
  /** Checks parameters before they are stored. */
  params: z.ZodType;
}

type TextKind<Params> = Omit<Template, 'channel' | 'write' | 'params' | 'holdsSecret'> & {
  params: z.ZodType<Params>;
  holdsSecret?: boolean;
};

export function text<Params extends object>(
  kind: TextKind<Params>,
  write: (t: Translate, params: Params) => string,
): Template & { params: z.ZodType<Params> } {
  return {
    holdsSecret: false,
    ...kind,
    channel: 'text',
    write: (t, params) => ({ body: write(t, kind.params.parse(params)) }),
  };
}

export function mail<Params extends object>(
  kind: Pick<Template, 'version' | 'holdsSecret'> & { params: z.ZodType<Params> },
  write: (t: Translate, params: Params) => Required<Words>,
): Template & { params: z.ZodType<Params> } {
  return {
    ...kind,
    channel: 'mail',
    audience: 'anyone',
    answersText: false,
    write: (t, params) => write(t, kind.params.parse(params)),
  };
}
