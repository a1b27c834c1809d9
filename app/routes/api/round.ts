import { startRound } from '~/commands/start-round.server';
import { roundBody } from '~/fill/wire';
import { apiWrite, noReading } from '~/services/api-request.server';

export const loader = noReading('PUT');

export const action = apiWrite('PUT', ['roundId'], roundBody, ({ actor, ids, body }) =>
  startRound(actor, ids.roundId, body),
);
