import type { Answers } from '../../trial/answers.schema.ts';

/** What was typed, without who measures, who is called and who is on shift: nobody outside the shop needs to know. */
export function withoutPeople({ measuring, call, crew, ...rest }: Answers): Answers {
  const { whoName: _who, ...measured } = measuring ?? {};
  return {
    ...rest,
    ...(measuring && { measuring: measured }),
    ...(call && { call: { lines: call.lines.map(({ whom: _whom, ...line }) => line) } }),
    ...(crew && { crew: { shifts: crew.shifts.map(({ id, name, from, to }) => ({ id, name, from, to })) } }),
  };
}
