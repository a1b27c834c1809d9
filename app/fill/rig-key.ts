import type { FillSetup } from '~/air';

/**
 * What an air profile is kept under: what was learned with another hose, chuck or gauge is not
 * taken over. A rig without names has a key of its own.
 */
export function rigKeyOf({ rig }: Pick<FillSetup, 'rig'>): string {
  return [rig?.hose, rig?.chuck, rig?.gaugeName].map((name) => name ?? '').join('|');
}
