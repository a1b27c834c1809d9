import type { Transaction } from 'sequelize';
import type { Actor } from '~/access/can';
import { createFill, type FillSetup } from '~/air';
import { rigKeyOf } from '~/fill/rig-key';
import type { RunBody } from '~/fill/wire';
import { toFillSetup } from '~/fill/wire-setup';
import type { Round } from '~/models/round.server';
import { Run } from '~/models/run.server';
import { requireRound } from '~/queries/round-access.server';
import { loadTirePlace } from '~/queries/tire-place.server';
import { Refusal } from '~/services/refusal.server';
import { changeCoach } from './coach-transaction.server';
import { refuseAfterClosing, tireNotOnCoach } from './record-cold-reading.server';
import { refuseOtherBody } from './same-body.server';
import { possibleMoment } from './start-time.server';

/** An attempt that arrives later than this after its start was begun without signal, ms. */
const offlineAfterMs = 60_000;

/**
 * Starts a fill under an id made on the phone and freezes what the engine starts from. Sent again,
 * it changes nothing. Two fills that are open at once on one coach: the second is refused while
 * online; begun without signal, both are kept and marked as overlapping.
 * @throws Refusal `round-not-found`, `not-allowed`; `other-body` when the id stands for another
 * fill; `fill-open`, naming the other fill; `round-closed`; `tire-not-on-coach`;
 * `unusable-setup`; `impossible-time`
 */
export async function startFill(
  actor: Actor,
  runId: string,
  body: RunBody,
): Promise<{ runId: string; overlapping: boolean }> {
  const { coachId } = await requireRound(actor, 'round:run', body.roundId);
  return changeCoach(actor, 'round:run', coachId, async (transaction) => {
    // Held, so that the round isn't closed meanwhile.
    const reach = { transaction, lock: true };
    const round = await requireRound(actor, 'round:run', body.roundId, reach);
    const known = await storedRun(runId, body, transaction);
    if (known) return { runId, overlapping: known.overlapping };
    const row = await rowOf(round, body, transaction);
    const overlapping = await overlapsOpenFill(coachId, row.startedAt, transaction);
    await Run.create({ id: runId, ...row, startedBy: actor.userId, overlapping }, { transaction });
    return { runId, overlapping };
  });
}

async function rowOf(round: Round, body: RunBody, transaction: Transaction) {
  const { v, setup: told, startedAt: begun, ...fields } = body;
  const startedAt = possibleMoment('startedAt', begun);
  refuseAfterClosing(round, startedAt, 'startedAt');
  const setup = toFillSetup(told);
  refuseUnusable(setup);
  const place = await loadTirePlace(round.coachId, body.tireId, startedAt, transaction);
  if (!place) throw tireNotOnCoach(body.tireId);
  const { coachId } = round;
  return {
    ...fields,
    setup,
    startedAt,
    coachId,
    position: place.position,
    rigKey: rigKeyOf(setup),
  };
}

/** Figures out of range are refused before; what is left is a supply or profile not the engine's. */
function refuseUnusable(setup: FillSetup): void {
  try {
    createFill(setup).supplyAt(0);
  } catch {
    const { supply = null, profile = null } = setup;
    throw new Refusal('bad-input', 'unusable-setup', 'The engine cannot start from this.', [
      {
        field: 'setup',
        value: { supply, profile },
        expected: "the engine's own supply and profile",
      },
    ]);
  }
}

/** The coach's row is locked, so nothing starts meanwhile. */
async function overlapsOpenFill(
  coachId: string,
  startedAt: Date,
  transaction: Transaction,
): Promise<boolean> {
  const where = { coachId, kind: 'fill' as const, endedSeq: null };
  const open = await Run.findOne({ where, transaction });
  if (!open) return false;
  if (Date.now() - startedAt.getTime() <= offlineAfterMs) throw fillOpen(open.id);
  await Run.update({ overlapping: true }, { where, transaction });
  return true;
}

const fillOpen = (openId: string) =>
  new Refusal('conflict', 'fill-open', 'Another fill is open on this coach. End it first.', [
    { field: 'runId', value: openId, expected: 'no other fill that is open on this coach' },
  ]);

async function storedRun(
  runId: string,
  { v, ...sent }: RunBody,
  transaction: Transaction,
): Promise<Run | null> {
  const stored = await Run.findByPk(runId, { transaction });
  if (!stored) return null;
  const { kind, roundId, tireId, startedAt, setup, engineVersion, deviceId } = stored;
  refuseOtherBody(
    'fill',
    { kind, roundId, tireId, startedAt, setup, engineVersion, deviceId },
    { ...sent, startedAt: new Date(sent.startedAt) },
  );
  return stored;
}
