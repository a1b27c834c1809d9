import type { ReactNode } from 'react';
import type { LiveSource } from '~/fill/live-driver';
import type { LiveScreenProps } from './live-props';
import { LiveScreen } from './live-screen';
import { useLiveScreen } from './use-live-screen';

export interface LiveFillProps {
  /** The same object for as long as it is the same fill; give another fill another React key. */
  source: LiveSource;
  /** What simulated gauges show. */
  shows?: LiveScreenProps['shows'];
  /** A line that stands until the first tap: what to do here. */
  hint?: string;
  /** A link in the head, such as back to the round. */
  way?: ReactNode;
  /** A strip under the head. */
  strip?: ReactNode;
}

/** The live screen over a source: the phone's store behind a real fill, or a practice. */
export function LiveFill({ source, ...extras }: LiveFillProps) {
  const { screen } = useLiveScreen(source);
  return <LiveScreen {...screen} {...extras} />;
}
