import { hoseGauge } from '~/fill/hose-gauge';
import { moreGroups } from '~/fill/more-keys';
import type { Notice } from '~/fill/notice';
import type { ScreenState } from '~/fill/screen-state';
import type { KeypadFor } from '~/fill/screen-ui';
import { formatPressure, gaugeKpa, type PressureUnit } from '~/units';
import { GaugeKeys, GaugeLabel } from './gauge-keys';
import { Keypad } from './keypad';
import type { LiveScreenProps } from './live-props';
import { MoreSheet } from './more-sheet';
import { NoticeStrip } from './notice-strip';
import { PressKey } from './press-key';
import { QuestionSheet } from './question-sheet';

type KeysProps = LiveScreenProps & { state: ScreenState };

/** Everything under the picture: a question, the sheet of more, the keypad, or the usual keys. */
export function LiveKeys(props: KeysProps) {
  const { ui, state, handlers, facts, setup, last } = props;
  if (ui.question) {
    return (
      <QuestionSheet
        question={ui.question}
        onRecord={handlers.record}
        onAcceptPedal={handlers.acceptPedal}
        onEnd={handlers.end}
        onClose={handlers.close}
      />
    );
  }
  if (ui.more) {
    return (
      <MoreSheet
        groups={moreGroups(facts, setup, last)}
        onPress={handlers.more}
        onClose={handlers.close}
      />
    );
  }
  return (
    <section className="live-keys" aria-label="Keys">
      {/* While the pedal's words are read nothing else asks for the thumb. */}
      {state.body === 'pedal-cautions' && !ui.keypad ? (
        <AnswerKeys state={state} handlers={handlers} />
      ) : (
        <>
          <Strip {...props} />
          {ui.keypad ? <TypedGauge {...props} /> : <OfferedGauge {...props} />}
        </>
      )}
    </section>
  );
}

function Strip(props: KeysProps) {
  const { ui, state, handlers, clock, last, hint, setup, unit, shows } = props;
  const first: Notice | undefined = hint && !last ? { text: hint, isHint: true } : undefined;
  const entered = ui.entered && ui.entered.until > clock ? ui.entered : undefined;
  const notice = ui.keypad ? undefined : (first ?? state.notice);
  const hasKey = Boolean(entered?.id ?? (!entered && notice?.done));
  const reads = gaugeNames[hoseGauge(setup)];
  const gauge = hasKey ? reads.split(' ')[0] : reads;
  return (
    <NoticeStrip
      entered={entered}
      notice={notice}
      label={
        !ui.keypad && (
          <GaugeLabel
            label={state.readNow ? `${gauge} now, ${unit}?` : `${gauge} reads, ${unit}`}
            isWanted={state.readNow}
            shows={shows?.hose}
          />
        )
      }
      onTakeBack={handlers.takeBack}
      onDone={(event, down) => handlers.record(event, down.at)}
      onDash={() => handlers.openKeypad('dash-gauge')}
    />
  );
}

function OfferedGauge({ ui, state, handlers, setup, unit }: KeysProps) {
  const reads = hoseGauge(setup);
  const values = (ui.row?.values ?? []).map((kpa, index) => ({
    key: String(index),
    text: formatPressure(gaugeKpa(kpa), unit, { withUnit: false, trim: true }),
  }));
  return (
    <>
      <GaugeKeys
        values={values}
        onPick={handlers.pickOffered}
        note={state.airMoves ? 'The gauge reads lower while air moves.' : undefined}
      />
      <div className="key-row key-row-low" data-count="3">
        <PressKey onPress={() => handlers.openKeypad(reads)}>Other value</PressKey>
        <PressKey onPress={(down) => handlers.record({ type: 'cut-out' }, down.at)}>
          It purged
        </PressKey>
        <PressKey onPress={handlers.openMore}>More</PressKey>
      </div>
      <AnswerKeys state={state} handlers={handlers} />
    </>
  );
}

function AnswerKeys({ state, handlers }: Pick<KeysProps, 'state' | 'handlers'>) {
  return (
    <div className="key-row key-row-answer" data-count={state.answers.length}>
      {state.answers.map((answer) => (
        <PressKey
          key={answer.label}
          className={`key-answer ${answer.fill === 'plain' ? '' : `key-${answer.fill}`}`}
          onPress={(down) => handlers.answer(answer, down)}
        >
          {answer.label}
        </PressKey>
      ))}
    </div>
  );
}

function TypedGauge({ ui, state, handlers, facts, unit, shows }: KeysProps) {
  const keypad = ui.keypad;
  if (!keypad) return null;
  const wanted = state.body === 'tire-keypad' && keypad.reads === 'tire';
  return (
    <Keypad
      label={labelOf(keypad.reads, unit)}
      shows={keypad.reads === 'tire' ? shows?.tire : shows?.hose}
      text={keypad.text}
      problem={keypad.problem}
      onText={handlers.type}
      onEnter={handlers.enter}
    >
      <div className="key-row key-row-low" data-count={state.call === 'bleed' ? 2 : 1}>
        {state.call === 'bleed' && (
          <PressKey
            aria-pressed={facts.bleeding}
            onPress={(down) => handlers.record({ type: 'bleeding', on: !facts.bleeding }, down.at)}
          >
            {facts.bleeding ? 'Bleeding stopped' : 'Bleeding now'}
          </PressKey>
        )}
        {wanted ? (
          <PressKey onPress={handlers.openMore}>More</PressKey>
        ) : (
          <PressKey onPress={handlers.close}>Back</PressKey>
        )}
      </div>
    </Keypad>
  );
}

const gaugeNames: Record<KeypadFor, string> = {
  'wheel-gauge': 'Gauge at the wheel',
  'dash-gauge': 'Dash gauge',
  tire: 'Tire gauge',
};

function labelOf(reads: KeypadFor, unit: PressureUnit): string {
  return `${gaugeNames[reads]} reads, ${unit}`;
}
