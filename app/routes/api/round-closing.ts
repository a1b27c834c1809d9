import { closeRound } from '~/commands/close-round.server';
import { closingBody } from '~/fill/wire';
import { apiWrite, noReading } from '~/services/api-request.server';

export const loader = noReading('PUT');

export const action = apiWrite('PUT', ['roundId'], closingBody, ({ actor, ids, body }) =>
  closeRound(actor, ids.roundId, body),
);
