import type { FillEvent } from '~/air';
import { formatPressure, gaugeKpa, type PressureUnit } from '~/units';
import type { NewFillEvent } from './live-driver';

const speedWords = { off: 'Engine off', idle: 'Engine at idle', 'fast-idle': 'Fast idle set' };
const sourceWords = {
  'wheel-gauge': 'Gauge',
  'dash-gauge': 'Dash gauge',
  sensor: 'Sensor',
};

/** An event in the words of the person who tapped it, for "entered" and for taking back. */
export function eventWords(
  event: FillEvent | NewFillEvent,
  unit: PressureUnit,
  valve = false,
): string {
  const shown = (kpa: number) => formatPressure(gaugeKpa(kpa), unit, { trim: true });
  switch (event.type) {
    case 'engine':
      return speedWords[event.speed];
    case 'supply-reading':
      return `${sourceWords[event.source]} ${shown(event.kpa)}`;
    case 'tire-reading':
      return `Tire ${shown(event.kpa)}`;
    case 'cut-out':
      return 'It purged';
    case 'cut-in':
      return 'It cut in';
    case 'lowering':
      return loweringWords(event.by, event.on);
    case 'chuck':
      if (valve) return event.on ? 'Valve open' : 'Valve closed';
      return event.on ? 'Chuck on' : 'Chuck off';
    case 'bleeding':
      return event.on ? 'Bleeding' : 'Bleeding stopped';
    case 'crew':
      return event.helper ? 'Helper is here' : 'Helper has left';
    case 'place':
      return event.where === 'seat' ? 'You are at the seat' : 'You are at the wheel';
    case 'low-air':
      return event.on ? 'Low-air warning on' : 'Low-air warning out';
    case 'call-shown':
      return 'Call shown';
    case 'taken-back':
      return 'Taken back';
  }
}

function loweringWords(by: 'pedal' | 'drain', on: boolean): string {
  if (by === 'drain') return on ? 'Drain open' : 'Drain closed';
  return on ? 'Pedal in use' : 'Pedal let go';
}
