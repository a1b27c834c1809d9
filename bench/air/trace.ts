import type { Advice, FillEvent, FillSetup } from './adviser';
import type { Run, Watch } from './fill-run';
import { toPsi } from './flow';
import { pressureAbs } from './vessel';
import { activeTire, fittingKpa, settledKpa, type World } from './world';

/** A line without any event is printed this often, s. */
const QUIET_S = 10;

const one = (kpa: number): string => toPsi(kpa).toFixed(1).padStart(5);
const band = ({ p10, p50, p90 }: Advice['supplyKpa']): string =>
  `${one(p10)}<${one(p50)}<${one(p90)}`;

/** Prints one fill as it runs: what was tapped, what was said, and what was true. Pressures psi. */
export function tracer(print: (line: string) => void): Watch {
  let printedAt = Number.NEGATIVE_INFINITY;
  let said = '';
  return {
    began: (setup) => print(describeSetup(setup)),
    asked: (run, advice) => {
      if (printedAt === Number.NEGATIVE_INFINITY) {
        listenIn(run, print);
        for (const line of heading(run.world)) print(line);
      }
      const saying = sayingOf(advice);
      if (saying === said && run.now - printedAt < QUIET_S) return;
      const mark = saying === said ? ' ' : '»';
      print(
        `${time(run.now)} ${truth(run.world)}  ${mark} ${saying.padEnd(44)} ${beliefs(advice)}`,
      );
      said = saying;
      printedAt = run.now;
    },
  };
}

function listenIn(run: Run, print: (line: string) => void): void {
  run.phone.onEvent = (event) => {
    if (event.type !== 'call-shown') print(`${time(run.now)}    tap ${factsOf(event)}`);
  };
}

function time(now: number): string {
  return now.toFixed(1).padStart(7);
}

function sayingOf(advice: Advice): string {
  const cab = advice.cab && advice.cab !== 'nothing' ? ` cab:${advice.cab}` : '';
  const by = advice.by ? ` by:${advice.by}` : '';
  return `${advice.call} (${advice.reason})${cab}${by}`;
}

function beliefs(advice: Advice): string {
  const change = advice.changeIn ? ` change ${advice.changeIn.p50.toFixed(0)}s` : '';
  const read = advice.readIn === undefined ? '' : ` read ${advice.readIn.toFixed(0)}s`;
  const odds = `loaded ${advice.loaded.toFixed(2)} in ${advice.flowsIn.toFixed(2)}`;
  return `sup ${band(advice.supplyKpa)} tire ${band(advice.tireKpa)} ${odds}${change}${read}`;
}

function truth(world: World): string {
  const wet = pressureAbs(world.supply) - world.coach.atmosphereKpa;
  const state = [
    world.loaded ? 'L' : '-',
    world.speed === 'fast-idle' ? 'F' : 'i',
    world.pedal ? 'P' : world.drain ? 'D' : '-',
    { off: '-', open: 'O', blocked: 'B', leaking: 'K' }[world.chuck],
    world.bleeding ? 'b' : '-',
  ].join('');
  const tire = `tire ${one(settledKpa(world))}`;
  return `[fit ${one(fittingKpa(world))} wet ${one(wet)} ${tire} ${state}]`;
}

function factsOf(event: FillEvent): string {
  const { type, at, id: _id, ...rest } = event;
  const facts = Object.entries(rest).map(([key, value]) =>
    key === 'kpa' || key === 'stepKpa'
      ? `${key.replace('kpa', 'psi').replace('Kpa', 'Psi')}=${toPsi(Number(value)).toFixed(1)}`
      : `${key}=${String(value)}`,
  );
  return `${type} at ${at.toFixed(1)} ${facts.join(' ')}`;
}

function heading(world: World): string[] {
  const { coach } = world;
  const tire = activeTire(world);
  return [
    `coach ${coach.id} ${coach.hard ? 'hard' : 'easy'}, fitting on ${coach.fitting}, tanks ${[coach.supplyL, coach.serviceL, coach.accessoryL].map((l) => l.toFixed(0)).join('/')} L`,
    `cut-in ${one(coach.cutInKpa)} cut-out ${one(coach.cutOutKpa)} psi, delivery ${coach.idleDelivery.toFixed(1)}/${coach.fastDelivery.toFixed(1)} dm3/s, leak ${toPsi(coach.leakKpaPerS * 60).toFixed(1)} psi/min, brake ${one(coach.brakeKpa)} psi, lower by ${coach.lowerBy.join(' or ') || 'nothing'}`,
    `tire start ${one(tire.startKpa)} target ${one(tire.targetKpa)} ±${one(tire.toleranceKpa)} limit ${one(tire.limitKpa)} psi, ${tire.volumeL.toFixed(0)} L (said ${tire.saidVolumeL}), core ${tire.coreC.toFixed(3)} hose ${coach.hoseToGaugeC.toFixed(2)}, ${tire.reachable ? 'reachable' : 'not reachable'}`,
    `gauges: tee bias ${one(coach.tee.biasKpa)} step ${one(coach.tee.stepKpa)}, dash bias ${one(coach.dash.biasKpa)} step ${one(coach.dash.stepKpa)}, tire step ${one(coach.tireGauge.stepKpa)} psi; ${coach.valve ? 'valve below gauge' : 'gauge at chuck'}`,
    '[fitting, wet tank, settled tire; L loaded, F fast idle, P pedal, D drain, O open, B blocked, K leaking, b bleeding]  » what is said',
  ];
}

/** What the product was told before the first tap. */
function describeSetup(setup: FillSetup): string {
  const { profile, supply, ...rest } = setup;
  const known =
    [profile && 'profile', supply && 'supply'].filter(Boolean).join(' and ') || 'nothing';
  return `set-up ${JSON.stringify(rest)}; known before: ${known}`;
}
