/** Bad input is refused with a RangeError that names the field and the value. */
import type { FillEvent, FillSetup } from './contract';

const MOST_KPA = 1400;
const MOST_SECONDS = 24 * 3600;

function refuse(field: string, value: unknown, expected: string): never {
  throw new RangeError(`${field} is ${String(value)}; expected ${expected}`);
}

function between(field: string, value: unknown, low: number, high: number, unit: string): void {
  if (typeof value !== 'number' || !(value >= low && value <= high)) {
    refuse(field, value, `${low} to ${high} ${unit}`);
  }
}

function above0(field: string, value: unknown, most: number, unit: string): void {
  if (typeof value !== 'number' || !(value > 0 && value <= most)) {
    refuse(field, value, `above 0, at most ${most} ${unit}`);
  }
}

function oneOf(field: string, value: unknown, allowed: readonly unknown[]): void {
  if (!allowed.includes(value)) refuse(field, value, `one of ${allowed.join(', ')}`);
}

export function checkTime(field: string, at: unknown): void {
  between(field, at, 0, MOST_SECONDS, 's');
}

/** @throws RangeError naming the field and the value */
export function checkSetup(setup: FillSetup): void {
  const { tire, rig, crew } = setup;
  between('tire.startKpa', tire.startKpa, 0, MOST_KPA, 'kPa');
  between('tire.targetKpa', tire.targetKpa, 0, MOST_KPA, 'kPa');
  above0('tire.toleranceKpa', tire.toleranceKpa, MOST_KPA, 'kPa');
  above0('tire.volumeL', tire.volumeL, 10000, 'L');
  if (tire.limitKpa !== undefined) {
    between('tire.limitKpa', tire.limitKpa, 0, MOST_KPA, 'kPa');
    if (tire.targetKpa > tire.limitKpa) {
      refuse('tire.targetKpa', tire.targetKpa, `at most the limit, ${tire.limitKpa} kPa`);
    }
  }
  if (rig) {
    oneOf('rig.gauge', rig.gauge, ['at-chuck', 'above-valve', 'below-valve', 'dash-only']);
    if (rig.stepKpa !== undefined) above0('rig.stepKpa', rig.stepKpa, MOST_KPA, 'kPa');
  }
  for (const by of setup.lowerBy ?? []) oneOf('lowerBy', by, ['pedal', 'drain']);
  if (crew?.walkSeconds !== undefined) {
    between('crew.walkSeconds', crew.walkSeconds, 0, 600, 's');
  }
  if (setup.atmosphereKpa !== undefined) {
    between('atmosphereKpa', setup.atmosphereKpa, 30, 120, 'kPa');
  }
  if (setup.seed !== undefined && !Number.isFinite(setup.seed)) {
    refuse('seed', setup.seed, 'a finite number');
  }
}

const EVENT_TYPES = [
  'engine',
  'supply-reading',
  'cut-out',
  'cut-in',
  'lowering',
  'chuck',
  'tire-reading',
  'bleeding',
  'crew',
  'place',
  'low-air',
  'call-shown',
  'taken-back',
] as const;

function onOff(field: string, value: unknown): void {
  oneOf(field, value, [true, false]);
}

/** @throws RangeError naming the field and the value */
export function checkEvent(event: FillEvent): void {
  checkTime('at', event.at);
  oneOf('type', event.type, EVENT_TYPES);
  switch (event.type) {
    case 'engine':
      oneOf('speed', event.speed, ['off', 'idle', 'fast-idle']);
      break;
    case 'supply-reading':
      oneOf('source', event.source, ['wheel-gauge', 'dash-gauge', 'sensor']);
      checkReading(event.kpa, event.stepKpa);
      break;
    case 'tire-reading':
      checkReading(event.kpa, event.stepKpa);
      break;
    case 'lowering':
      oneOf('by', event.by, ['pedal', 'drain']);
      onOff('on', event.on);
      break;
    case 'chuck':
    case 'bleeding':
    case 'low-air':
      onOff('on', event.on);
      break;
    case 'crew':
      onOff('helper', event.helper);
      break;
    case 'place':
      oneOf('where', event.where, ['seat', 'wheel']);
      break;
    case 'taken-back':
      if (typeof event.of !== 'string' || event.of === '') refuse('of', event.of, 'an id');
  }
}

function checkReading(kpa: unknown, stepKpa: unknown): void {
  between('kpa', kpa, 0, MOST_KPA, 'kPa');
  if (stepKpa !== undefined) above0('stepKpa', stepKpa, MOST_KPA, 'kPa');
}
