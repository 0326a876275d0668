import { z } from 'zod';
import { sealSchema } from '#rules/engine/finding';
import { roomToMoveSchema } from '#rules/engine/room';
import { roomWordsSchema } from '#rules/engine/room-words';
import { endpoint } from './endpoint';
import { revisionParams } from './submittals';

export const roomViewSchema = z.strictObject({
  /** Null where the section chose no rules for it, or the check was made by an engine that did not compute it. */
  room: roomToMoveSchema.extend({ words: roomWordsSchema }).nullable(),
  /** The declared binder content of the revision before, %, where it was checked. */
  earlier: z.strictObject({ revision: z.number().int(), binderContent: z.number() }).nullable(),
  seal: sealSchema,
  startingPoint: z.boolean(),
});

export const getRoom = endpoint({
  method: 'get',
  path: '/api/submittals/:submittalId/revisions/:number/room',
  summary: 'The range of binder content in which the chosen rules hold, rule by rule, with what closes it',
  params: revisionParams,
  response: roomViewSchema,
});

export type RoomView = z.infer<typeof roomViewSchema>;
