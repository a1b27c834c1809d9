import type { ScreenState } from '~/fill/screen-state';
import { formatPressure, gaugeKpa } from '~/units';
import { CallPanel } from './call-panel';
import { LiveKeys } from './live-keys';
import type { LiveScreenProps } from './live-props';
import { LiveVessel } from './live-vessel';
import { PressClockContext } from './press-key';
import { PedalCautions } from './question-sheet';

/** The wheel side of a fill. It shows what it is given and calls back; it keeps nothing. */
export function LiveScreen(props: LiveScreenProps) {
  const { state, ui, press } = props;
  const body = bodyName(props);
  return (
    <PressClockContext value={press}>
      <main
        className="live"
        data-side={state?.side ?? 'unknown'}
        data-act={(state?.act && body === 'vessel') || undefined}
        data-body={body}
        data-call={state?.call}
      >
        <LiveHead {...props} />
        {props.strip}
        {state ? <CallPanel state={state} /> : <FirstPanel />}
        {body !== 'pedal-cautions' && (
          <section className="live-body live-level" aria-label="Level">
            {state && <LiveVessel vessel={state.vessel} bare={state.act} />}
          </section>
        )}
        {body === 'pedal-cautions' && !ui.question && (
          <section className="live-body" aria-label="Before the pedal">
            <PedalCautions />
          </section>
        )}
        {state && <LiveKeys {...props} state={state} />}
        <Heard state={state} said={saidNow(props)} />
      </main>
    </PressClockContext>
  );
}

function bodyName({ state, ui }: LiveScreenProps) {
  if (ui.question?.kind === 'pedal') return 'pedal-cautions';
  if (ui.more) return 'more';
  if (ui.keypad && !ui.question) return 'keypad';
  return state?.body === 'pedal-cautions' ? 'pedal-cautions' : 'vessel';
}

function LiveHead({ tireName, setup, unit, way }: LiveScreenProps) {
  const from = formatPressure(gaugeKpa(setup.tire.startKpa), unit, { withUnit: false, trim: true });
  const to = formatPressure(gaugeKpa(setup.tire.targetKpa), unit, { trim: true });
  return (
    <header className="live-head">
      <b>{tireName}</b>
      <span>
        <span aria-hidden="true">
          {from} → {to}
        </span>
        <span className="only-heard">
          from {from} to {to}
        </span>
      </span>
      {way}
    </header>
  );
}

function FirstPanel() {
  return (
    <section className="call-panel" aria-label="Call">
      <h1>One moment</h1>
      <p className="call-why">The screen is starting.</p>
      <noscript>
        <p className="call-why">
          It needs scripts: the phone itself says when to put the chuck on.
        </p>
      </noscript>
    </section>
  );
}

/** What "Where it stands" was asked for, while it stands in the strip. */
function saidNow({ ui: { entered }, clock }: LiveScreenProps): string | undefined {
  return entered && !entered.id && entered.until > clock ? entered.text : undefined;
}

/**
 * Both regions stand from the first paint; they change only when call or reason does, or when the
 * present state is asked for.
 */
function Heard({ state, said }: { state: ScreenState | undefined; said: string | undefined }) {
  const heard = state?.heard;
  return (
    <>
      <div className="only-heard" role="status">
        {said ?? (heard && !heard.urgent ? heard.text : '')}
      </div>
      <div className="only-heard" role="alert">
        {heard?.urgent ? heard.text : ''}
      </div>
    </>
  );
}
