import type { CoachBasis, Wheel } from '~/fill/fill-setup';
import { type FillSummary, summariseFill } from '~/fill/fill-summary';
import {
  fillsOfRound,
  newestReadings,
  type PhoneState,
  type RoundState,
  type RunState,
} from '~/fill/store';
import { type ColdVerdict, type SortedTire, walkOrderOf } from '~/loads';
import type { CoachHead } from '~/queries/coach.server';
import type { PressureUnit } from '~/units';
import { checkOf } from './tire-check';

/** What the page of a round is made from, whether the server or this phone tells it. */
export interface RoundPageData {
  round: RoundState;
  coach: CoachBasis;
  fitting: CoachHead['fitting'];
  fills: FillSummary[];
  newestFill: RunState | null;
  mayRun: boolean;
  mayEdit: boolean;
  unit: PressureUnit;
}

/** A tire in a round: what was read of it, what it needs, and its newest fill. */
export interface RoundTire extends SortedTire {
  wheel: Wheel;
  warm: boolean;
  fill: FillSummary | undefined;
}

/** A round as it stands, from the server's page and what this phone knows beside it. */
export interface RoundView extends RoundPageData {
  /** Front first, left to right. */
  tires: RoundTire[];
  findings: ReturnType<typeof checkOf>['findings'];
  complete: boolean;
  /** The next tire to read on the walk round the coach. */
  next: RoundTire | undefined;
  openFill: FillSummary | undefined;
}

/** Puts what the phone knows over what the server told. */
export function viewRound(page: RoundPageData, phone: PhoneState): RoundView {
  const round = phone.rounds[page.round.id] ?? page.round;
  const fills = mergedFills(page, phone);
  const readings = newestReadings(round);
  const { coach } = page;
  const check = checkOf(
    coach.wheels.map(({ tireId, position, targetKpa, limitKpa }) => {
      const reading = readings.get(tireId);
      return {
        position,
        targetKpa,
        limitKpa,
        kpa: reading?.kpa ?? null,
        warm: reading?.warm ?? false,
      };
    }),
    coach.toleranceKpa,
  );
  const tires = check.tires.flatMap((tire, index): RoundTire[] => {
    const wheel = coach.wheels[index];
    if (!wheel) return [];
    const warm = readings.get(wheel.tireId)?.warm ?? false;
    const fill = fills.findLast(({ tireId }) => tireId === wheel.tireId);
    return [{ ...tire, wheel, warm, fill }];
  });
  const { findings, complete } = check;
  const next = walkOrderOf(coach.layout)
    .map((position) => tires.find((tire) => tire.position === position))
    .find((tire) => tire?.kpa === null);
  const openFill = fills.find(({ how }) => how === null);
  return { ...page, round, fills, tires, findings, complete, next, openFill };
}

/** This phone's own log of a fill is never behind what the server told of it. */
function mergedFills(page: RoundPageData, phone: PhoneState): FillSummary[] {
  const own = fillsOfRound(phone, page.round.id).map(summariseFill);
  const byId = new Map([...page.fills, ...own].map((fill) => [fill.id, fill]));
  return [...byId.values()].sort((a, b) => (a.startedAt < b.startedAt ? -1 : 1));
}

/** The fill before the next one: it hands on the supply and what it learned. */
export function earlierFill(view: RoundPageData, phone: PhoneState): RunState | undefined {
  return fillsOfRound(phone, view.round.id).at(-1) ?? view.newestFill ?? undefined;
}

/** A fill of it ended on target; what the cold check said of it is past. */
export const isFilled = ({ fill }: Pick<RoundTire, 'fill'>): boolean => fill?.how === 'done';

/** What a tire still needs; a tire that was filled on target needs nothing. */
export const needOf = (tire: RoundTire): ColdVerdict =>
  isFilled(tire) ? { kind: 'in-tolerance' } : tire.verdict;
