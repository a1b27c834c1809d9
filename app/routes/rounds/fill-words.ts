import { dualMateOf, positionName } from '~/loads';
import { missingForFill } from '../coaches/first-fill';
import { isFilled, type RoundTire, type RoundView } from './round-data';

/** Why no fill of a tire can be started now, in words; empty when one can. */
export function whyNoFill(view: RoundView, tire: RoundTire): string {
  if (view.round.closedAt) return 'This round is closed.';
  if (isFilled(tire)) return 'It is filled already.';
  const missing = missingForFill({ ...view.coach, fitting: view.fitting })[0];
  if (tire.fillable && missing) return missing.words;
  if (!tire.fillable) return unfillableWords(tire, view);
  if (view.openFill && view.openFill.tireId !== tire.wheel.tireId) {
    return `A fill of ${positionName(view.openFill.position).toLowerCase()} is open. End it first.`;
  }
  return '';
}

/** A sound tire that wants air waits only for its dual to be read. */
function unfillableWords(tire: RoundTire, view: RoundView): string {
  const wantsAir =
    tire.verdict.kind === 'needs-air' || (tire.verdict.kind === 'warm' && tire.verdict.belowTarget);
  const mate = dualMateOf(tire.position);
  const unread = view.tires.find(({ position, kpa }) => position === mate && kpa === null);
  if (wantsAir && unread) return `Read ${positionName(unread.position).toLowerCase()} first.`;
  return 'No fill is timed for this tire.';
}
