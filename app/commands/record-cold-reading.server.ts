import type { Transaction } from 'sequelize';
import type { Actor } from '~/access/can';
import type { ReadingBody } from '~/fill/wire';
import { ColdReading } from '~/models/cold-reading.server';
import { sequelize } from '~/models/database.server';
import type { Round } from '~/models/round.server';
import { requireRound } from '~/queries/round-access.server';
import { loadTirePlace } from '~/queries/tire-place.server';
import { Refusal } from '~/services/refusal.server';
import { refuseOtherBody } from './same-body.server';
import { possibleMoment } from './start-time.server';

/**
 * Keeps what a gauge showed on a tire, gauge kPa, with the target of its day. Several readings of a
 * tire may be kept; the one read last counts.
 * @throws Refusal `round-not-found`, `not-allowed`; `other-body` when the id stands for another
 * reading; `tire-not-on-coach`; `round-closed` when it was read after the closing;
 * `impossible-time`
 */
export async function recordColdReading(
  actor: Actor,
  roundId: string,
  readingId: string,
  body: ReadingBody,
): Promise<{ readingId: string }> {
  return sequelize.transaction(async (transaction) => {
    const round = await requireRound(actor, 'round:run', roundId, { transaction });
    if (await isStored(roundId, readingId, body, transaction)) return { readingId };
    const row = await rowOf(round, body, transaction);
    await ColdReading.bulkCreate([{ id: readingId, roundId, ...row }], {
      transaction,
      ignoreDuplicates: true,
    });
    await isStored(roundId, readingId, body, transaction);
    return { readingId };
  });
}

async function rowOf(round: Round, body: ReadingBody, transaction: Transaction) {
  const { tireId, kpa, warm } = body;
  const readAt = possibleMoment('readAt', body.readAt);
  refuseAfterClosing(round, readAt, 'readAt');
  const place = await loadTirePlace(round.coachId, tireId, readAt, transaction);
  if (!place) throw tireNotOnCoach(tireId);
  return { tireId, pressureKpa: kpa, warm, readAt, ...place };
}

/** @throws Refusal `round-closed` when something happened after its round was closed */
export function refuseAfterClosing(round: Round, at: Date, field: string): void {
  if (!round.closedAt || at <= round.closedAt) return;
  throw new Refusal('conflict', 'round-closed', 'This round is closed. Start a new one.', [
    {
      field,
      value: at.toISOString(),
      expected: `a time before ${round.closedAt.toISOString()}, when the round was closed`,
    },
  ]);
}

/** A tire that the round's coach has never had. */
export const tireNotOnCoach = (tireId: string) =>
  new Refusal('bad-input', 'tire-not-on-coach', 'This coach has no such tire.', [
    { field: 'tireId', value: tireId, expected: 'the id of a tire of this coach' },
  ]);

async function isStored(
  roundId: string,
  readingId: string,
  { v, ...sent }: ReadingBody,
  transaction: Transaction,
): Promise<boolean> {
  const stored = await ColdReading.findByPk(readingId, { transaction });
  if (!stored) return false;
  const { tireId, pressureKpa: kpa, warm, readAt } = stored;
  refuseOtherBody(
    'reading',
    { roundId: stored.roundId, tireId, kpa, warm, readAt },
    { ...sent, roundId, readAt: new Date(sent.readAt) },
  );
  return true;
}
