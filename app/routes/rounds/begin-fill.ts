import { startFill } from '~/fill/commands';
import { composeFillSetup } from '~/fill/fill-setup';
import { thisPhone } from '~/fill/phone';
import { earlierFill, type RoundTire, type RoundView } from './round-data';

/** Seeds of the engine: whole numbers below this. */
const seeds = 2 ** 32;

/** Starts the fill of a tire on this phone; returns its id. */
export function beginFill(view: RoundView, tire: RoundTire): string {
  const phone = thisPhone();
  const { round, coach } = view;
  const { wheel, warm } = tire;
  const setup = composeFillSetup({
    coach,
    round,
    wheel,
    startKpa: startKpa(tire),
    warm,
    earlier: earlierFill(view, phone.store.getState()),
    now: phone.clock.serverNow(),
    seed: Math.floor(Math.random() * seeds),
  });
  const { tireId, position } = wheel;
  return startFill({ roundId: round.id, coachId: coach.id, tireId, position, setup }, phone);
}

/** What the tire holds now: what its last fill left it at, or what the cold check read. */
export const startKpa = ({ fill, kpa }: RoundTire): number => fill?.endKpa ?? kpa ?? 0;
