/**
 * The air bench: `npm run bench:air`. It runs people and product in a simulated world of its own
 * and prints the rows of "What good looks like" (design/engine.md), times as ratios to a perfect
 * player who sees every true pressure from the same start and only whose hands take time.
 *
 * Simulated, and richer than the engine's model (world.ts, coach.ts; nothing of app/air in it):
 * three kinds of fitting (on the service tanks, on the supply tank, on an accessory tank behind
 * protection and check valve), check valves that take a little to open, a governor that jitters
 * from cycle to cycle, delivery with speed, pressure and altitude, a drier that uses air at
 * cut-out, leaks, single pushes on the pedal, the drain, fast idle lost on the pedal, ISO 6358 flow
 * solved on both sides of the gauge, cores that differ up to twofold, tires and tanks that warm and
 * settle, badly seated chucks. Crews (driver.ts, helper.ts, alone.ts): late, forgotten and mistyped
 * taps, a second phone whose taps arrive late, false hisses, looks away. Gauges: biased, rounded.
 * The tire gauge alone has no bias, since the target is meant by it.
 *
 * Not simulated: a gauge below a closed valve, engine stopped in mid-fill, air suspension and
 * parking brake drawing air, temperature of the day, hoses that hold air of their own.
 *
 * First is the first tire of a coach without a profile; later are the other three of that round
 * (profile() and supplyAt() of the fill before); next round is another day, with what the round
 * before taught. Advice is asked twice a second while the call may change within six seconds, else
 * once a second, and at once after a tap. The world steps by 0.1 s.
 *
 * Flags: --coaches N (100; twice as many for plain and expert), --seed-from N, --held-out (coaches
 * from 1 000 000 on: not to be used while tuning), --people-only, --product-only, --who <actor>,
 * --quick (12 coaches), --rounds N (2), --alone, --come-and-go, --dash-only, --every <seconds> (a
 * reading so often, instead of when asked), --no-purge, --json, --workers N (1),
 * --variants (the product under each departure, side by side, one round),
 * --trace <coach>:<tire> (one fill's timeline; tires 5 to 8 are the next round's; --who all-seeing
 * traces the floor), --speed (milliseconds, beside a reference integration).
 */

import { type Habits, VARIANTS } from './habits';
import { type Job, runJob } from './job';
import { type Options, readOptions, type Who } from './options';
import type { FillOutcome } from './outcome';
import { runAll } from './pool';
import { printSpeed } from './speed';
import { type Column, columnOf, tableOf, worstOf } from './table';
import { tracer } from './trace';

const WORST_SHOWN = 12;

async function main(): Promise<void> {
  const options = readOptions(process.argv.slice(2));
  if (options.trace) await trace(options, options.trace);
  else if (options.speed) await printSpeed(options);
  else await compare(options);
}

async function trace(options: Options, { coach, tire, who }: NonNullable<Options['trace']>) {
  const job: Job = { who, coach, rounds: tire > 4 ? 2 : 1, habits: options.habits };
  const print = (line: string) => console.log(line);
  const outcomes = await runJob(job, (index) => (index === tire - 1 ? tracer(print) : undefined));
  const { adviseMs, ...end } = outcomes[tire - 1]!;
  console.log({ ...end, asked: adviseMs.length });
}

interface Group {
  who: Who;
  title: string;
  habits: Habits;
  rounds: number;
}

async function compare(options: Options): Promise<void> {
  const from = performance.now();
  const groups = groupsOf(options);
  const jobs = groups.map((group) => jobsFor(group, options));
  const flat = jobs.flat();
  const results = await runAll(flat, options.workers, (done) => showProgress(done, flat.length));
  const fills = jobs.map((own) => {
    const mine = new Set(own);
    return results.filter(({ job }) => mine.has(job)).flatMap(({ outcomes }) => outcomes);
  });
  const columns = groups.map(({ who, title }, i) => columnOf(who, fills[i]!, title));
  if (options.json) console.log(JSON.stringify({ options, columns }, null, 2));
  else print(options, columns, fills[fills.length - 1]!);
  console.error(
    `${((performance.now() - from) / 1000).toFixed(0)} s, ${options.workers} process(es)`,
  );
}

function groupsOf({ who, habits, rounds, variants }: Options): Group[] {
  if (!variants) return who.map((one) => ({ who: one, title: one, habits, rounds }));
  return VARIANTS.map(([title, own]) => ({ who: 'product', title, habits: own, rounds: 1 }));
}

function print(options: Options, columns: Column[], last: FillOutcome[]): void {
  console.log(titleOf(options));
  console.log(tableOf(columns));
  console.log(
    `\nWorst of ${columns[columns.length - 1]!.title} (look with --trace <coach>:<tire>):`,
  );
  for (const line of worstOf(last, WORST_SHOWN)) console.log(`  ${line}`);
}

function jobsFor({ who, habits, rounds }: Group, options: Options): Job[] {
  const person = who === 'plain' || who === 'expert';
  const coaches = person ? options.peopleCoaches : options.coaches;
  const { from } = options;
  return Array.from({ length: coaches }, (_, i) => ({ who, coach: from + i, rounds, habits }));
}

function titleOf({ from, coaches, habits }: Options): string {
  const odd = Object.entries(habits).filter(([, value]) => value !== false && value !== null);
  const how = odd.map(([name, value]) => (value === true ? name : `${name} ${value}`)).join(', ');
  return `Coaches ${from} to ${from + coaches - 1}${how ? `, ${how}` : ''}\n`;
}

function showProgress(done: number, all: number): void {
  if (process.stderr.isTTY) process.stderr.write(`\r${done} of ${all} coaches `);
}

await main();
