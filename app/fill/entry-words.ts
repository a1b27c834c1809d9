import { formatPressure, type GaugeKpa, type Parsed, type PressureUnit } from '~/units';

/** What is wrong with a typed pressure and what is expected, for beside the field. */
export function problemWords(
  parsed: Exclude<Parsed<GaugeKpa>, { ok: true }>,
  unit: PressureUnit,
): string {
  switch (parsed.problem) {
    case 'empty':
      return 'Type what the gauge shows.';
    case 'not-a-number':
      return `“${parsed.text}” is not a number. Type one like ${sample[unit]}.`;
    case 'out-of-range':
      return `Type a pressure from ${figure(parsed.minimum, unit)} to ${formatPressure(parsed.maximum, unit)}.`;
  }
}

const sample: Record<PressureUnit, string> = { psi: '104.5', kPa: '720', bar: '7.2' };

function figure(kpa: GaugeKpa, unit: PressureUnit): string {
  return formatPressure(kpa, unit, { withUnit: false, trim: true });
}
