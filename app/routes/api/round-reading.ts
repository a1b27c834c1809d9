import { recordColdReading } from '~/commands/record-cold-reading.server';
import { readingBody } from '~/fill/wire';
import { apiWrite, noReading } from '~/services/api-request.server';

export const loader = noReading('PUT');

export const action = apiWrite(
  'PUT',
  ['roundId', 'readingId'],
  readingBody,
  ({ actor, ids, body }) => recordColdReading(actor, ids.roundId, ids.readingId, body),
);
