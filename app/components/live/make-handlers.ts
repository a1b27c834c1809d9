import type { Dispatch } from 'react';
import type { Advice, FillEvent } from '~/air';
import { problemWords } from '~/fill/entry-words';
import { isFar } from '~/fill/far-reading';
import { valueBefore } from '~/fill/gauge-row';
import { hoseGauge } from '~/fill/hose-gauge';
import type { LiveSource, NewFillEvent } from '~/fill/live-driver';
import type { ScreenState } from '~/fill/screen-state';
import {
  type KeypadFor,
  type RowFrame,
  type ScreenUi,
  takeBackSeconds,
  type UiAction,
} from '~/fill/screen-ui';
import { formatPressure, gaugeKpa, parsePressure } from '~/units';
import type { LiveHandlers } from './live-handlers';

interface Frame {
  source: LiveSource;
  ui: ScreenUi;
  dispatch: Dispatch<UiAction>;
  advice: Advice | undefined;
  state: ScreenState | undefined;
  frame: RowFrame;
  last: FillEvent | undefined;
  words: (event: FillEvent | NewFillEvent) => string;
}

/** Turns presses into events of the source and steps of the screen's memory. */
export function makeHandlers(f: Frame): LiveHandlers {
  const { source, ui, dispatch, advice, frame } = f;
  const { unit, setup } = source;
  const shown = (kpa: number) => formatPressure(gaugeKpa(kpa), unit, { trim: true });

  const record = (event: NewFillEvent, at: number, index?: number) => {
    if (!advice) return;
    const id = source.tap(event, at);
    const entered = { id, text: f.words(event), until: until() };
    const isRow = event.type === 'supply-reading' && event.source === hoseGauge(setup);
    const place = isRow ? (index ?? -1) : undefined;
    dispatch({ type: 'recorded', entered, index: place });
  };
  const askFirst = (event: NewFillEvent, at: number) => {
    const needsReading = event.type === 'lowering' && event.by === 'pedal' && event.on;
    if (!needsReading || ui.pedalAccepted) record(event, at);
    else dispatch({ type: 'ask', question: { kind: 'pedal', event, at } });
  };
  const end = () => {
    dispatch({ type: 'close' });
    source.end();
  };

  return {
    pickOffered(index, down) {
      const kpa = ui.row?.values[index];
      if (!ui.row || kpa === undefined) return;
      const stepKpa = ui.row.stepKpa;
      const reading = (value: number) => supplyReading(hoseGauge(setup), value, stepKpa, 'offered');
      const before = valueBefore(ui.row, index, down.clock);
      if (before === undefined) return record(reading(kpa), down.at, index);
      const choices = [before, kpa].map((v) => ({ event: reading(v), shown: shown(v) }));
      dispatch({ type: 'ask', question: { kind: 'which', choices, at: down.at } });
    },
    enter(down) {
      if (!ui.keypad || !advice) return;
      const { reads, text } = ui.keypad;
      const parsed = parsePressure(text, unit);
      if (!parsed.ok) return dispatch({ type: 'refuse', problem: problemWords(parsed, unit) });
      const event = typedReading(reads, parsed.value, frame.gaugeStepKpa);
      const forecast = reads === 'tire' ? advice.tireKpa : advice.supplyKpa;
      if (!isFar(parsed.value, forecast)) return record(event, down.at);
      const expected = shown(forecast.p50);
      const asked = { event, at: down.at, shown: shown(parsed.value), expected };
      dispatch({ type: 'ask', question: { kind: 'far', ...asked } });
    },
    answer({ does }, down) {
      if ('event' in does) askFirst(does.event, down.at);
      else if (does.step === 'end') end();
      else dispatch({ type: 'accept-pedal' });
    },
    more({ does }, down) {
      if ('event' in does) askFirst(does.event, down.at);
      else if ('opens' in does) dispatch({ type: 'open-keypad', reads: does.opens });
      else if (does.step === 'end') dispatch({ type: 'ask', question: { kind: 'end' } });
      else if (does.step === 'take-back') takeBack(f.last?.id);
      else say();
    },
    acceptPedal(event, at) {
      dispatch({ type: 'accept-pedal' });
      record(event, at);
    },
    record: askFirst,
    takeBack,
    end,
    openKeypad: (reads) => dispatch({ type: 'open-keypad', reads }),
    type: (text) => dispatch({ type: 'type', text }),
    openMore: () => dispatch({ type: 'open-more' }),
    close: () => dispatch({ type: 'close' }),
  };

  function takeBack(id: string | undefined) {
    if (id) source.takeBack(id);
    dispatch({ type: 'taken-back' });
  }

  function say() {
    if (!f.state) return;
    const text = `${f.state.title}. ${f.state.vessel.words}`;
    dispatch({ type: 'said', entered: { id: undefined, text, until: until() } });
  }
}

function until(): number {
  return performance.now() / 1000 + takeBackSeconds;
}

function supplyReading(
  source: 'wheel-gauge' | 'dash-gauge',
  kpa: number,
  stepKpa: number,
  how: 'offered' | 'typed',
): NewFillEvent {
  return { type: 'supply-reading', source, kpa, stepKpa, how };
}

function typedReading(reads: KeypadFor, kpa: number, stepKpa: number): NewFillEvent {
  if (reads === 'tire') return { type: 'tire-reading', kpa, stepKpa };
  return supplyReading(reads, kpa, stepKpa, 'typed');
}
