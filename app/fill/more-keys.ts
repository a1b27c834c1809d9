import type { FillSetup } from '~/air';
import type { NewFillEvent } from './live-driver';
import type { LogFacts } from './log-facts';
import type { KeypadFor } from './screen-ui';

/** A key behind "More": records an event, opens a keypad, or does something on this screen. */
export interface MoreKey {
  label: string;
  does: { event: NewFillEvent } | { opens: KeypadFor } | { step: 'say' | 'take-back' | 'end' };
  /** It is so already: shown as pressed. */
  now?: boolean;
}

export interface MoreGroup {
  name: string;
  keys: readonly MoreKey[];
}

/** Everything that is rarely needed, grouped by where the hand is. */
export function moreGroups(
  facts: LogFacts,
  setup: FillSetup,
  last: string | undefined,
): MoreGroup[] {
  const log: MoreKey[] = [
    { label: 'Where it stands', does: { step: 'say' } },
    { label: 'End this fill', does: { step: 'end' } },
  ];
  if (last) log.unshift({ label: `Take back: ${last}`, does: { step: 'take-back' } });
  return [
    { name: 'Engine', keys: engineKeys(facts) },
    { name: 'Supply', keys: supplyKeys(facts, setup) },
    { name: 'Tire', keys: tireKeys(facts) },
    { name: 'People', keys: peopleKeys(facts) },
    { name: 'This fill', keys: log },
  ];
}

function engineKeys({ engine }: LogFacts): MoreKey[] {
  const speeds = [
    ['Off', 'off'],
    ['Idle', 'idle'],
    ['Fast idle', 'fast-idle'],
  ] as const;
  return speeds.map(([label, speed]) => ({
    label,
    does: { event: { type: 'engine', speed } },
    now: engine === speed,
  }));
}

function supplyKeys(facts: LogFacts, { lowerBy = [] }: FillSetup): MoreKey[] {
  const lowering = lowerBy.map((by): MoreKey => {
    const on = facts.lowering !== by;
    const labels =
      by === 'drain' ? ['Drain open', 'Drain closed'] : ['Pedal in use', 'Pedal let go'];
    return { label: labels[on ? 0 : 1] ?? '', does: { event: { type: 'lowering', by, on } } };
  });
  return [
    ...lowering,
    { label: 'It cut in', does: { event: { type: 'cut-in' } } },
    { label: 'Dash gauge', does: { opens: 'dash-gauge' } },
    {
      label: facts.lowAir ? 'Low air is out' : 'Low-air warning',
      does: { event: { type: 'low-air', on: !facts.lowAir } },
    },
  ];
}

function tireKeys({ bleeding, chuckOn }: LogFacts): MoreKey[] {
  if (chuckOn) return [];
  return [
    { label: 'Tire gauge', does: { opens: 'tire' } },
    {
      label: bleeding ? 'Bleeding stopped' : 'Bleeding',
      does: { event: { type: 'bleeding', on: !bleeding } },
    },
  ];
}

function peopleKeys({ helper, place }: LogFacts): MoreKey[] {
  const crew: MoreKey = {
    label: helper ? 'Helper has left' : 'Helper is here',
    does: { event: { type: 'crew', helper: !helper } },
  };
  if (helper) return [crew];
  const where = place === 'seat' ? 'wheel' : 'seat';
  return [crew, { label: `I’m at the ${where}`, does: { event: { type: 'place', where } } }];
}
