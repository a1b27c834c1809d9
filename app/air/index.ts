/**
 * The air engine: given what people have tapped so far, what should the person at the wheel do now,
 * and for how long? Pure: no clock, no network, no randomness that is not seeded.
 */
import { adviseAt } from './advise';
import { believe } from './belief';
import type { Fill, FillEvent, FillSetup } from './contract';
import { createEventLog } from './event-log';
import { createFilter } from './filter';
import { profileOf, supplyOf } from './profile';
import { checkSetup, checkTime } from './validate';

export * from './contract';
export {
  createPracticeCoach,
  type PracticeCoach,
  type PracticeNotice,
  type PracticeOptions,
  type PracticeSnapshot,
  restorePracticeCoach,
} from './practice';
export { REASONS, type Reason } from './reasons';

/** Changes whenever the same log could give another answer. */
export const ENGINE_VERSION: string = '5';

/**
 * Starts a fill.
 * @throws RangeError naming the field and the value, for a set-up out of range
 */
export function createFill(setup: FillSetup): Fill {
  checkSetup(setup);
  const own: FillSetup = structuredClone(setup);
  const log = createEventLog();
  const filter = createFilter(own, log);
  const startCutIn = believe(filter.stateAt(0).ensemble).cutIn;
  return {
    apply(event: FillEvent) {
      log.add(event);
    },
    advise(at) {
      checkTime('at', at);
      const { ensemble, events } = filter.stateAt(at);
      return adviseAt(ensemble, events, own, at, startCutIn);
    },
    profile() {
      return profileOf(filter.stateAt(log.lastAt()).ensemble, own);
    },
    supplyAt(at) {
      checkTime('at', at);
      return supplyOf(filter.stateAt(at).ensemble);
    },
  };
}
