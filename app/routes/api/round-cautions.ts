import { acknowledgeCautions } from '~/commands/acknowledge-cautions.server';
import { cautionsBody } from '~/fill/wire';
import { apiWrite, noReading } from '~/services/api-request.server';

export const loader = noReading('PUT');

export const action = apiWrite('PUT', ['roundId'], cautionsBody, ({ actor, ids, body }) =>
  acknowledgeCautions(actor, ids.roundId, body),
);
