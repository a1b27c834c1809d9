import { parseArgs } from 'node:util';
import { type Habits, USUAL } from './habits';

/** First coach of the range that must not be used while tuning, and its name on the page. */
export const HELD_OUT_FROM = 1_000_000;
const TUNING_FROM = 0;

export interface Options {
  from: number;
  coaches: number;
  peopleCoaches: number;
  rounds: number;
  workers: number;
  habits: Habits;
  who: Who[];
  json: boolean;
  speed: boolean;
  /** The product alone under each of VARIANTS, side by side. */
  variants: boolean;
  trace: { coach: number; tire: number; who: Who } | null;
}

export const WHO = ['plain', 'expert', 'all-seeing', 'product'] as const;
export type Who = (typeof WHO)[number];

const FLAGS = {
  coaches: { type: 'string' },
  'seed-from': { type: 'string' },
  'held-out': { type: 'boolean' },
  'people-only': { type: 'boolean' },
  'product-only': { type: 'boolean' },
  quick: { type: 'boolean' },
  alone: { type: 'boolean' },
  'come-and-go': { type: 'boolean' },
  'dash-only': { type: 'boolean' },
  every: { type: 'string' },
  'no-purge': { type: 'boolean' },
  rounds: { type: 'string' },
  workers: { type: 'string' },
  json: { type: 'boolean' },
  speed: { type: 'boolean' },
  variants: { type: 'boolean' },
  trace: { type: 'string' },
  who: { type: 'string' },
} as const;

const QUICK_COACHES = 12;
const USUAL_COACHES = 100;

/** Reads the flags that the comment in main.ts lists; an unreadable value throws a RangeError. */
export function readOptions(argv: string[]): Options {
  const { values } = parseArgs({ args: argv, options: FLAGS });
  const coaches = whole('coaches', values.coaches, values.quick ? QUICK_COACHES : USUAL_COACHES);
  const who = whoOf(values);
  return {
    from: whole('seed-from', values['seed-from'], values['held-out'] ? HELD_OUT_FROM : TUNING_FROM),
    coaches,
    peopleCoaches: 2 * coaches,
    rounds: whole('rounds', values.rounds, 2),
    workers: whole('workers', values.workers, 1),
    habits: {
      ...USUAL,
      alone: values.alone ?? false,
      comeAndGo: values['come-and-go'] ?? false,
      dashOnly: values['dash-only'] ?? false,
      noPurge: values['no-purge'] ?? false,
      every: values.every === undefined ? null : whole('every', values.every, 0),
    },
    who,
    json: values.json ?? false,
    speed: values.speed ?? false,
    variants: values.variants ?? false,
    trace: traceOf(values.trace, who),
  };
}

function whoOf(values: { who?: string; 'people-only'?: boolean; 'product-only'?: boolean }): Who[] {
  if (values.who !== undefined) {
    const named = WHO.find((who) => who === values.who);
    if (!named) throw new RangeError(`who: ${values.who} is none of ${WHO.join(', ')}`);
    return [named];
  }
  if (values['product-only']) return ['product'];
  return values['people-only'] ? ['plain', 'expert', 'all-seeing'] : [...WHO];
}

function whole(name: string, text: string | undefined, otherwise: number): number {
  if (text === undefined) return otherwise;
  const value = Number(text);
  if (Number.isInteger(value) && value >= 0) return value;
  throw new RangeError(`${name}: ${text} is not a whole number of 0 or more`);
}

function traceOf(text: string | undefined, who: Who[]): Options['trace'] {
  if (text === undefined) return null;
  const [coach, tire] = text.split(':').map(Number);
  if (Number.isInteger(coach) && Number.isInteger(tire) && tire! >= 1 && tire! <= 8) {
    return { coach: coach!, tire: tire!, who: who[who.length - 1]! };
  }
  throw new RangeError(
    `trace: ${text} is not <coach>:<tire>, tire 1 to 4 and 5 to 8 a round later`,
  );
}
