import { useCallback, useEffect, useMemo, useReducer, useRef, useSyncExternalStore } from 'react';
import { eventWords } from '~/fill/event-words';
import type { LiveSource } from '~/fill/live-driver';
import { factsOf, standing } from '~/fill/log-facts';
import { screenState } from '~/fill/screen-state';
import { blankUi, nextUi } from '~/fill/screen-ui';
import { useLive } from '~/fill/use-live';
import { defaultStepKpa } from '~/units';
import { makeHandlers } from './make-handlers';
import type { PressClock } from './press-key';

/** Under this width the gauge row has two values, so that a key stays 116 px wide. */
const narrowScreen = '(max-width: 347px)';

/** Seconds on a clock that never jumps, whatever the fill's own time does. */
const clockSeconds = () => performance.now() / 1000;

/** Runs a source and keeps the screen's own memory: everything that `LiveScreen` is given. */
export function useLiveScreen(source: LiveSource) {
  const view = useLive(source);
  const [ui, dispatch] = useReducer(nextUi, blankUi);
  const isPressing = useRef(false);
  const count = useNarrow() ? 2 : 3;
  const { advice, at, events } = view;
  const gaugeStepKpa = source.setup.rig?.stepKpa ?? defaultStepKpa(source.unit);

  useEffect(() => {
    if (!advice) return;
    const frame = { gaugeStepKpa, count };
    const now = clockSeconds();
    dispatch({ type: 'advised', advice, at, now, pressing: isPressing.current, frame });
  }, [advice, at, gaugeStepKpa, count]);

  const press = useMemo<PressClock>(
    () => ({
      stamp: () => ({ at: source.now(), clock: clockSeconds() }),
      pressing: (down) => {
        isPressing.current = down;
      },
    }),
    [source],
  );
  const facts = useMemo(() => factsOf(events, source.setup), [events, source.setup]);
  const last = useMemo(() => lastTapped(events), [events]);
  const words = useCallback(
    (event: Parameters<typeof eventWords>[0]) =>
      eventWords(event, source.unit, source.setup.rig?.valve),
    [source],
  );
  const { unit, setup, wallClock } = source;
  const { countdown, offBy, pedalAccepted } = ui;
  const state =
    advice &&
    screenState({ advice, setup, unit, at, facts, countdown, offBy, pedalAccepted, wallClock });
  const frame = { gaugeStepKpa, count };
  const handlers = makeHandlers({ source, ui, dispatch, advice, state, frame, last, words });
  return {
    view,
    screen: {
      tireName: source.tireName,
      setup,
      unit,
      state,
      ui,
      facts,
      last: last && words(last),
      handlers,
      press,
      clock: typeof performance === 'undefined' ? 0 : clockSeconds(),
    },
  };
}

/** The last event that a person tapped and that still stands. */
function lastTapped(events: ReturnType<LiveSource['events']>) {
  return standing(events).findLast((event) => event.type !== 'call-shown' && event.id);
}

function useNarrow(): boolean {
  return useSyncExternalStore(
    (changed) => {
      const query = matchMedia(narrowScreen);
      query.addEventListener('change', changed);
      return () => query.removeEventListener('change', changed);
    },
    () => matchMedia(narrowScreen).matches,
    () => false,
  );
}
