import type { FillSetup } from '~/air';

/** The gauge that the row of values stands for: without one on the hose it is the dash gauge. */
export function hoseGauge({ rig }: FillSetup): 'wheel-gauge' | 'dash-gauge' {
  return rig?.gauge === 'dash-only' ? 'dash-gauge' : 'wheel-gauge';
}
