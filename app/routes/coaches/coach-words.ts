import { type ColdCheck, positionName, type SortedTire } from '~/loads';
import type { PressureUnit } from '~/units';
import { amount } from '../rounds/verdict-words';

const numberWords = ['none', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight'];
const dayMs = 24 * 60 * 60 * 1000;

/** Says what a coach's tires need before it is driven, in a few plain sentences. */
export function needWords({ tires }: Pick<ColdCheck, 'tires'>, unit: PressureUnit): string {
  if (tires.every(({ verdict }) => verdict.kind === 'not-read')) {
    return 'No tire has been read yet. Start a round and check them cold.';
  }
  const of = (kind: SortedTire['verdict']['kind']) =>
    tires.filter(({ verdict }) => verdict.kind === kind);
  const sentences = [
    tooLowWords([...of('too-low'), ...of('mate-too-low')]),
    airWords(of('needs-air'), unit),
    overWords(of('over'), unit),
    warmLowWords(of('warm').filter(isWarmLow)),
    warmWords(of('warm').filter((tire) => !isWarmLow(tire))),
    notReadWords(of('not-read')),
    restWords(of('in-tolerance').length, tires.length),
  ];
  return sentences.filter(Boolean).join(' ');
}

const names = (tires: readonly SortedTire[]) =>
  inWords(tires.map(({ position }, index) => nameIn(position, index)));

/** Position names begin a sentence; inside one they are written small. */
function nameIn(position: SortedTire['position'], index: number): string {
  const name = positionName(position);
  return index === 0 ? name : name.charAt(0).toLowerCase() + name.slice(1);
}

function inWords(parts: readonly string[]): string {
  if (parts.length < 2) return parts.join('');
  return `${parts.slice(0, -1).join(', ')} and ${parts.at(-1)}`;
}

function tooLowWords(tires: readonly SortedTire[]): string {
  if (tires.length === 0) return '';
  const [verb, them] = tires.length === 1 ? ['has', 'it'] : ['have', 'them'];
  return `${names(tires)} ${verb} to be looked at by a technician. Don’t fill ${them}.`;
}

function airWords(tires: readonly SortedTire[], unit: PressureUnit): string {
  if (tires.length === 0) return '';
  const parts = tires.flatMap(({ position, verdict }, index) =>
    verdict.kind === 'needs-air'
      ? `${nameIn(position, index)} ${index === 0 ? 'needs ' : ''}${amount(verdict.byKpa, unit)}`
      : [],
  );
  if (tires.length <= 2) return `${inWords(parts)} before you drive.`;
  return `${names(tires)} need air before you drive.`;
}

function overWords(tires: readonly SortedTire[], unit: PressureUnit): string {
  const [tire] = tires;
  if (!tire) return '';
  if (tires.length === 1 && tire.verdict.kind === 'over' && tire.verdict.byKpa > 0) {
    return `${positionName(tire.position)} is ${amount(tire.verdict.byKpa, unit)} over.`;
  }
  return `${names(tires)} ${tires.length === 1 ? 'is' : 'are'} over.`;
}

const isWarmLow = ({ verdict }: SortedTire) => verdict.kind === 'warm' && verdict.belowTarget;

function warmLowWords(tires: readonly SortedTire[]): string {
  if (tires.length === 0) return '';
  const [was, them] = tires.length === 1 ? ['was', 'it'] : ['were', 'them'];
  return `${names(tires)} ${was} read warm and still low. Fill ${them} and check again cold.`;
}

function warmWords(tires: readonly SortedTire[]): string {
  if (tires.length === 0) return '';
  const [was, them] = tires.length === 1 ? ['was', 'it'] : ['were', 'them'];
  return `${names(tires)} ${was} read warm. Check ${them} again cold.`;
}

function notReadWords(tires: readonly SortedTire[]): string {
  if (tires.length === 0) return '';
  return `${names(tires)} ${tires.length === 1 ? 'has' : 'have'} not been read.`;
}

function restWords(holding: number, all: number): string {
  if (holding === 0) return '';
  const count = numberWords[holding];
  if (holding === all) return `All ${count} hold.`;
  return holding === 1 ? 'The other one holds.' : `The other ${count} hold.`;
}

/** "Next cold check is due in 12 days." Nothing while it isn't known. */
export function dueWords(due: Date | null, now: Date): string {
  if (!due) return '';
  const days = Math.round((due.getTime() - now.getTime()) / dayMs);
  if (days === 0) return 'The next cold check is due today.';
  const count = `${Math.abs(days)} ${Math.abs(days) === 1 ? 'day' : 'days'}`;
  return days > 0
    ? `The next cold check is due in ${count}.`
    : `The next cold check was due ${count} ago.`;
}

/** "Three axles". */
export const layoutWords = (layout: 'two-axles' | 'with-tag') =>
  layout === 'with-tag' ? 'Three axles' : 'Two axles';

/** "14 November", with the year when it isn't this one; by the clock of the place. */
export function dayWords(at: Date, now: Date, timeZone = 'UTC'): string {
  const sameYear = at.getUTCFullYear() === now.getUTCFullYear();
  return new Intl.DateTimeFormat('en-GB', {
    day: 'numeric',
    month: 'long',
    ...(sameYear ? {} : { year: 'numeric' }),
    timeZone,
  }).format(at);
}
