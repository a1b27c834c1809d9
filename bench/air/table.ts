import { type Figures, figuresOf, quantile } from './figures';
import type { Who } from './options';
import type { FillOutcome } from './outcome';

/** A column group: first tire of a coach without a profile, later tires, and a later round. */
export interface Column {
  who: Who;
  title: string;
  first: Figures;
  later: Figures;
  next: Figures | null;
  all: Figures;
  adviseP50Ms: number;
  adviseP99Ms: number;
  adviseMaxMs: number;
}

const TIRES = 4;

export function columnOf(who: Who, fills: readonly FillOutcome[], title: string = who): Column {
  const next = fills.filter((fill) => fill.tire >= TIRES);
  const firstRound = fills.filter((fill) => fill.tire < TIRES);
  const ms = fills.flatMap((fill) => fill.adviseMs);
  return {
    who,
    title,
    first: figuresOf(firstRound.filter((fill) => fill.tire === 0)),
    later: figuresOf(firstRound.filter((fill) => fill.tire > 0)),
    next: next.length > 0 ? figuresOf(next) : null,
    all: figuresOf(fills),
    adviseP50Ms: quantile(ms, 0.5),
    adviseP99Ms: quantile(ms, 0.99),
    adviseMaxMs: ms.reduce((most, value) => Math.max(most, value), 0),
  };
}

type Cell = (figures: Figures) => string;

const plain =
  (key: keyof Figures, digits: number): Cell =>
  (figures) =>
    spell(figures[key], digits);
const percent =
  (key: keyof Figures): Cell =>
  (figures) =>
    Number.isNaN(figures[key]) ? '–' : `${spell(100 * figures[key], 1)} %`;

function spell(value: number, digits: number): string {
  if (Number.isNaN(value)) return '–';
  return Number.isFinite(value) ? value.toFixed(digits) : 'never';
}

/** Rows as design/engine.md has them, with its goal for the product. */
const ROWS: [string, Cell, string][] = [
  ['time to done, median', plain('ratioMedian', 2), '1.25 / 1.20'],
  ['time to done, 90th percentile', plain('ratioP90', 2), '1.8 / 1.7'],
  ['hard coaches, median', plain('hardMedian', 2), '1.25'],
  ['hard coaches, 90th percentile', plain('hardP90', 2), '1.9'],
  ['put on, mean times a tire', plain('putOn', 1), '2.0 / 1.9'],
  ['tires that had to be bled', percent('bled'), '5 % / 4 %'],
  ['error when settled, p95, psi', plain('errorPsiP95', 1), '1.2 / 1.1'],
  ['lost > 0.1 psi to reverse flow', percent('lost'), '1 % / 0.5 %'],
  ['all taps, median', plain('taps', 0), '12 / 10'],
  ['not done, or without proof', percent('failed'), '1 % / 1 %'],
  ['said unreachable, wrongly', percent('wronglyUnreachable'), '1 %'],
  ['said unreachable, rightly', percent('rightlyUnreachable'), '≥ 95 %'],
  ['passed the limit', percent('overLimit'), '0'],
  ['80 % band holds supply', percent('supplyBand'), '80 %'],
  ['80 % band holds tire', percent('tireBand'), '80 %'],
  ['seconds, median', plain('secondsMedian', 0), ''],
  ['perfect player, seconds, median', plain('perfectMedianS', 0), ''],
];

/** Rows that mean nothing for people without the product. */
const NOT_OF_PEOPLE = new Set([
  'all taps, median',
  'passed the limit',
  '80 % band holds supply',
  '80 % band holds tire',
]);

/** The table as Markdown: first tire / later tires / the next round (product only). */
export function tableOf(columns: readonly Column[]): string {
  const head = ['figure: first / later tires', ...columns.map(headOf), 'goal'];
  const rows = ROWS.map(([name, cell, goal]) => [
    name,
    ...columns.map((column) => cells(column, name, cell)),
    goal,
  ]);
  const timed = columns.filter((column) => column.who === 'product');
  const speed = timed.map(
    (column) =>
      `advise, ${column.title}: median ${column.adviseP50Ms.toFixed(2)} ms, p99 ${column.adviseP99Ms.toFixed(2)} ms, ` +
      `longest ${column.adviseMaxMs.toFixed(1)} ms (goal: p99 4 ms)`,
  );
  return [...layOut([head, ...rows]), '', ...speed].join('\n');
}

function headOf({ title, next }: Column): string {
  return next ? `${title} / next round` : title;
}

function cells(column: Column, name: string, cell: Cell): string {
  const person = column.who === 'plain' || column.who === 'expert';
  if (person && NOT_OF_PEOPLE.has(name)) return '–';
  const both = `${cell(column.first)} / ${cell(column.later)}`;
  const all =
    name.startsWith('hard') || name.startsWith('said') ? ` (all ${cell(column.all)})` : '';
  return column.next ? `${both} / ${cell(column.next)}${all}` : `${both}${all}`;
}

function layOut(rows: string[][]): string[] {
  const widths = rows[0]!.map((_, i) => Math.max(...rows.map((row) => row[i]!.length)));
  const lines = rows.map((row) => `| ${row.map((c, i) => c.padEnd(widths[i]!)).join(' | ')} |`);
  const rule = `|${widths.map((width) => '-'.repeat(width + 2)).join('|')}|`;
  return [lines[0]!, rule, ...lines.slice(1)];
}

/** Worst fills, to look at with --trace. */
export function worstOf(fills: readonly FillOutcome[], most: number): string[] {
  const bad = fills.filter(
    (fill) => fill.reachable !== !fill.saidUnreachable || (fill.reachable && !fill.done),
  );
  const slow = fills
    .filter((fill) => fill.done && !bad.includes(fill))
    .sort((a, b) => b.seconds / b.perfectSeconds - a.seconds / a.perfectSeconds);
  return [...bad, ...slow].slice(0, most).map(lineOf);
}

function lineOf(fill: FillOutcome): string {
  const ratio = (fill.seconds / fill.perfectSeconds).toFixed(2);
  const end = fill.done ? (fill.proven ? 'done' : 'done without proof') : 'not done';
  const said = fill.saidUnreachable ? ', said unreachable' : '';
  const could = fill.reachable ? '' : ' (not reachable)';
  return (
    `${fill.coach}:${fill.tire + 1}${could} ${end}${said}, ${fill.seconds.toFixed(0)} s, ` +
    `ratio ${ratio}, put on ${fill.putOn}, taps ${fill.taps}${fill.bled ? ', bled' : ''}`
  );
}
