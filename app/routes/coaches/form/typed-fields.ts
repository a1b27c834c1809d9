import { z } from 'zod';
import {
  type AltitudeUnit,
  type Celsius,
  formatAltitude,
  formatPressure,
  formatPressureDifference,
  formatTemperature,
  formatVolume,
  type GaugeKpa,
  type KpaDifference,
  type Metres,
  type Parsed,
  type PressureUnit,
  parseAltitude,
  parsePressure,
  parsePressureDifference,
  parseTemperature,
  parseVolume,
  type TemperatureUnit,
} from '~/units';

interface Words<Value> {
  /** What is asked for, as it goes on after "Type": "the target pressure". */
  what: string;
  /** One that would be accepted, with its unit. */
  example: string;
  /** The bound, with its unit. */
  shown: (bound: Value) => string;
}

/** A text field that must read as a quantity; its messages say what is expected. */
function quantityField<Value>(parse: (text: string) => Parsed<Value>, words: Words<Value>) {
  return z.string(`Type ${words.what}.`).transform((text, context): Value => {
    const parsed = parse(text);
    if (parsed.ok) return parsed.value;
    context.addIssue({ code: 'custom', message: problemWords(parsed, words), input: text });
    return z.NEVER;
  });
}

/** Says what is wrong with what was typed, and what is expected. */
export function problemWords<Value>(
  parsed: Exclude<Parsed<Value>, { ok: true }>,
  { what, example, shown }: Words<Value>,
): string {
  if (parsed.problem === 'empty') return `Type ${what}, for example ${example}.`;
  if (parsed.problem === 'not-a-number') {
    return `“${parsed.text.trim()}” is not a figure. Type ${what}, for example ${example}.`;
  }
  return `Type ${what} between ${shown(parsed.minimum)} and ${shown(parsed.maximum)}.`;
}

/** The range that a limit or target may have: the engine's, and the database's. */
const limitRange = { minimum: 100 as GaugeKpa, maximum: 1400 as GaugeKpa };
const examplePressure: Record<PressureUnit, string> = {
  psi: '112 psi',
  kPa: '770 kPa',
  bar: '7.7 bar',
};

/** A sidewall limit, wheel limit or target, 100 to 1400 kPa. */
export const limitField = (unit: PressureUnit, what: string) =>
  quantityField((text) => parsePressure(text, unit, limitRange), {
    what,
    example: examplePressure[unit],
    shown: (kpa) => formatPressure(kpa, unit, { trim: true }),
  });

/** What a gauge showed, 0 to 1400 kPa. */
export const readingField = (unit: PressureUnit) =>
  quantityField((text) => parsePressure(text, unit), {
    what: 'what the gauge shows',
    example: examplePressure[unit],
    shown: (kpa) => formatPressure(kpa, unit, { trim: true }),
  });

/** A tolerance or a gauge's graduation, in kPa between the bounds. */
export const differenceField = (
  unit: PressureUnit,
  words: { what: string; example: string },
  range: { minimum: number; maximum: number },
) =>
  quantityField(
    (text) =>
      parsePressureDifference(text, unit, {
        minimum: range.minimum as KpaDifference,
        maximum: range.maximum as KpaDifference,
      }),
    { ...words, shown: (kpa) => formatPressureDifference(kpa, unit, { trim: true }) },
  );

export const volumeField = () =>
  quantityField(parseVolume, {
    what: 'the volume of air in litres',
    example: '150 L',
    shown: (volume) => formatVolume(volume),
  });

/** Altitudes of roads, metres: wider than any, and the database's own range. */
const roadAltitude = { lowest: -500, highest: 5000 };

export const altitudeField = (unit: AltitudeUnit) =>
  quantityField((text) => onRoads(parseAltitude(text, unit)), {
    what: 'the altitude',
    example: unit === 'ft' ? '850 ft' : '260 m',
    shown: (metres) => formatAltitude(metres, unit),
  });

function onRoads(parsed: Parsed<Metres>): Parsed<Metres> {
  const { lowest, highest } = roadAltitude;
  if (
    parsed.ok
      ? parsed.value >= lowest && parsed.value <= highest
      : parsed.problem !== 'out-of-range'
  ) {
    return parsed;
  }
  return {
    ok: false,
    problem: 'out-of-range',
    minimum: lowest as Metres,
    maximum: highest as Metres,
  };
}

/** The outdoor temperatures that a round may have, °C: the database's own range. */
const outdoors = { coldest: -50, hottest: 60 };

export const temperatureField = (unit: TemperatureUnit) =>
  quantityField((text) => outdoor(parseTemperature(text, unit)), {
    what: 'the temperature of the air',
    example: unit === '°F' ? '55 °F' : '13 °C',
    shown: (temperature) => formatTemperature(temperature, unit),
  });

function outdoor(parsed: Parsed<Celsius>): Parsed<Celsius> {
  const { coldest, hottest } = outdoors;
  if (parsed.ok ? parsed.value >= coldest : parsed.problem !== 'out-of-range') return parsed;
  return {
    ok: false,
    problem: 'out-of-range',
    minimum: coldest as Celsius,
    maximum: hottest as Celsius,
  };
}

/** A short text that must be there. */
export const nameField = (what: string, longest: number) =>
  z
    .string(`Type ${what}.`)
    .trim()
    .min(1, `Type ${what}.`)
    .max(longest, `Type ${what} in ${longest} characters or fewer.`);
