import type { ReactNode } from 'react';
import type { FillSetup } from '~/air';
import type { LogFacts } from '~/fill/log-facts';
import type { ScreenState } from '~/fill/screen-state';
import type { ScreenUi } from '~/fill/screen-ui';
import type { PressureUnit } from '~/units';
import type { LiveHandlers } from './live-handlers';
import type { PressClock } from './press-key';

export interface LiveScreenProps {
  tireName: string;
  setup: FillSetup;
  unit: PressureUnit;
  /** Undefined until the first advice. */
  state: ScreenState | undefined;
  ui: ScreenUi;
  facts: LogFacts;
  /** The last thing tapped, in words, for taking back. */
  last: string | undefined;
  handlers: LiveHandlers;
  press: PressClock;
  /** Seconds on the clock of `ui.entered`. */
  clock: number;
  /** What simulated gauges show; a real gauge is read by the person. */
  shows?: { hose: string; tire: string };
  /** A line that stands until the first tap: what to do here. */
  hint?: string;
  /** The other way in the head, such as back to the round. */
  way?: ReactNode;
  /** A strip under the head: practice's own controls. */
  strip?: ReactNode;
}
