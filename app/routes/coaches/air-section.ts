import type { CoachHead } from '~/queries/coach.server';
import type { PressureUnit } from '~/units';
import type { FormAnswer } from './form/read-form';

/** What each form of the air page is given. */
export interface AirSection {
  coach: Pick<CoachHead, 'rig' | 'fitting' | 'lowerBy' | 'mayEdit'>;
  unit: PressureUnit;
  now: Date;
  /** The form's own answer, when it came back. */
  answer: FormAnswer | undefined;
  /** It was kept just now. */
  saved: boolean;
}
