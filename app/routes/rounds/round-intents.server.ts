import { randomInt } from 'node:crypto';
import { redirect } from 'react-router';
import type { Actor } from '~/access/can';
import { ENGINE_VERSION } from '~/air';
import { acknowledgeCautions } from '~/commands/acknowledge-cautions.server';
import { closeRound } from '~/commands/close-round.server';
import { recordColdReading } from '~/commands/record-cold-reading.server';
import { startFill } from '~/commands/start-fill.server';
import { composeFillSetup } from '~/fill/fill-setup';
import { newId } from '~/fill/ids';
import { emptyPhone } from '~/fill/store';
import { type RunBody, versioned } from '~/fill/wire';
import { requireRound } from '~/queries/round-access.server';
import { Refusal } from '~/services/refusal.server';
import type { Viewer } from '~/services/viewer.server';
import { runForForm, sendBack } from '../coaches/form/answer-form.server';
import { type FormValues, readForm } from '../coaches/form/read-form';
import { startKpa } from './begin-fill';
import { whyNoFill } from './fill-words';
import { earlierFill, type RoundView, viewRound } from './round-data';
import { loadRoundPage } from './round-page.server';
import { closingSchema, fillSchema, readingSchema } from './round-schema';

/** What a form of a round's page is answered from. */
interface Asked {
  viewer: Viewer;
  roundId: string;
  values: FormValues;
}

/** Answers the forms of a round where no script runs: the same commands as a phone's. */
export async function answerRoundForm({ viewer, roundId, values }: Asked) {
  const { actor } = viewer;
  await requireRound(actor, 'round:run', roundId);
  switch (values.intent) {
    case 'cautions':
      await acknowledgeCautions(actor, roundId, versioned({ acknowledgedAt: nowText() }));
      return redirect(`/rounds/${roundId}`);
    case 'reading':
      return keepReading({ viewer, roundId, values });
    case 'fill':
      return beginFill({ viewer, roundId, values });
    case 'close':
      return close(actor, roundId, values);
    default:
      throw new Refusal('bad-input', 'unknown-intent', 'This form asks for nothing known here.');
  }
}

const nowText = () => new Date().toISOString();

async function keepReading({ viewer, roundId, values }: Asked) {
  const read = readForm(readingSchema(viewer.pressureUnit), values);
  if (!read.ok) return sendBack(read.answer);
  const body = versioned({ ...read.data, readAt: nowText() });
  const done = await runForForm(values, () =>
    recordColdReading(viewer.actor, roundId, newId(), body),
  );
  return done.ok ? redirect(`/rounds/${roundId}`) : sendBack(done.answer);
}

async function beginFill({ viewer, roundId, values }: Asked) {
  const read = readForm(fillSchema, values);
  if (!read.ok) return sendBack(read.answer);
  const view = viewRound(await loadRoundPage(viewer, roundId), emptyPhone);
  const body = fillBody(view, read.data.tireId, viewer.sessionId);
  const runId = newId();
  const done = await runForForm(values, () => startFill(viewer.actor, runId, body));
  return done.ok ? redirect(`/fills/${runId}`) : sendBack(done.answer);
}

/** @throws Refusal `not-fillable` when this tire is not to be filled, or the rig is not ready */
function fillBody(view: RoundView, tireId: string, deviceId: string): RunBody {
  const tire = view.tires.find(({ wheel }) => wheel.tireId === tireId);
  const why = tire ? whyNoFill(view, tire) : 'This coach has no such tire.';
  if (!tire || why) throw new Refusal('conflict', 'not-fillable', why);
  const setup = composeFillSetup({
    coach: view.coach,
    round: view.round,
    wheel: tire.wheel,
    startKpa: startKpa(tire),
    warm: tire.warm,
    earlier: earlierFill(view, emptyPhone),
    now: Date.now(),
    seed: randomInt(2 ** 32 - 1),
  });
  return versioned({
    kind: 'fill' as const,
    roundId: view.round.id,
    tireId,
    startedAt: nowText(),
    setup: setup as RunBody['setup'],
    engineVersion: ENGINE_VERSION,
    deviceId,
  });
}

async function close(actor: Actor, roundId: string, values: FormValues) {
  const read = readForm(closingSchema, values);
  if (!read.ok) return sendBack(read.answer);
  const body = versioned({ closedAt: nowText(), afterwards: read.data.afterwards });
  const done = await runForForm(values, () => closeRound(actor, roundId, body));
  return done.ok ? redirect(`/rounds/${roundId}`) : sendBack(done.answer);
}
