import type { TimeText } from '~/fill/countdown';
import type { ScreenState } from '~/fill/screen-state';

/** Call, countdown and why. Filled or framed by the side, large when it is to be acted on. */
export function CallPanel({ state }: { state: ScreenState }) {
  return (
    <section className="call-panel" aria-label="Call">
      <h1>{state.title}</h1>
      {(state.time || state.offBy) && (
        <div className="call-time">
          {state.time && <Time time={state.time} wide={state.call === 'read-supply'} />}
          {state.offBy && (
            <p className="call-off-by">
              Off by <b>{state.offBy}</b>
            </p>
          )}
        </div>
      )}
      <p className="call-why">
        {state.why} {state.next}
      </p>
    </section>
  );
}

function Time({ time, wide }: { time: TimeText; wide: boolean }) {
  return (
    <p className="call-figure" data-wide={wide || undefined}>
      {time.before && <small className="call-about">{time.before} </small>}
      {time.figure}
      {time.after && <small> {time.after}</small>}
    </p>
  );
}
