import { startFill } from '~/commands/start-fill.server';
import { runBody } from '~/fill/wire';
import { apiWrite, noReading } from '~/services/api-request.server';

export const loader = noReading('PUT');

export const action = apiWrite('PUT', ['runId'], runBody, ({ actor, ids, body }) =>
  startFill(actor, ids.runId, body),
);
