import { appendEvents } from '~/commands/append-events.server';
import { eventsBody, eventsQuery } from '~/fill/wire';
import { readEvents } from '~/queries/run-log.server';
import { apiRead, apiWrite } from '~/services/api-request.server';

export const loader = apiRead(['runId'], eventsQuery, ({ actor, ids, body }) =>
  readEvents(actor, ids.runId, body.after),
);

export const action = apiWrite('POST', ['runId'], eventsBody, ({ actor, ids, body }) =>
  appendEvents(actor, ids.runId, body),
);
