/**
 * A real governed supply: 66 minutes of a rail vehicle's air production unit (MetroPT-3, UCI
 * Machine Learning Repository, dataset 791, CC BY 4.0; Davari, Veloso, Ribeiro, Gama), recorded
 * 1 February 2020. Cut-in 8.07 bar, cut-out 10.09 bar, up in about 100 s, down in about 1950 s.
 * Not a coach, and outside the usual prior. `real-supply.csv` holds it.
 */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { createFill, createPracticeCoach } from './index';
import { KPA_PER_PSI } from './priors';

interface Row {
  at: number;
  kpa: number;
  loaded: boolean;
}

const rows: Row[] = readFileSync(join(import.meta.dirname, 'real-supply.csv'), 'utf8')
  .trim()
  .split('\n')
  .slice(1)
  .map((line) => {
    const [seconds, bar, loaded] = line.split(',').map(Number);
    return { at: seconds!, kpa: bar! * 100, loaded: loaded === 1 };
  });

interface Foretold {
  at: number;
  model: number;
  line: number;
  within: boolean;
}

/** Reads it every 20 s, rounded to 1 psi, and hears the cut-outs; each next reading is foretold. */
function follow(): Foretold[] {
  const fill = createFill({
    tire: { startKpa: 300, targetKpa: 690, toleranceKpa: 7, volumeL: 150 },
    lowerBy: [],
    seed: 11,
  });
  fill.apply({ type: 'engine', speed: 'idle', at: 0 });
  const told: Foretold[] = [];
  const read: { at: number; kpa: number }[] = [];
  let lastAt = -20;
  let wasLoaded = false;
  for (const row of rows) {
    if (wasLoaded && !row.loaded) fill.apply({ type: 'cut-out', at: row.at });
    wasLoaded = row.loaded;
    if (row.at - lastAt < 19) continue;
    lastAt = row.at;
    const kpa = Math.round(row.kpa / KPA_PER_PSI) * KPA_PER_PSI;
    if (read.length >= 2) told.push(foretell(fill, read, row));
    fill.apply({ type: 'supply-reading', source: 'sensor', kpa, stepKpa: KPA_PER_PSI, at: row.at });
    read.push({ at: row.at, kpa });
  }
  return told;
}

function foretell(
  fill: ReturnType<typeof createFill>,
  read: { at: number; kpa: number }[],
  row: Row,
): Foretold {
  const { supplyKpa } = fill.advise(row.at);
  const [a, b] = read.slice(-2) as [{ at: number; kpa: number }, { at: number; kpa: number }];
  const line = b.kpa + ((b.kpa - a.kpa) * (row.at - b.at)) / (b.at - a.at);
  // The band is for the true pressure; half a graduation of the reading is no fault of it.
  const half = KPA_PER_PSI / 2;
  const within = row.kpa >= supplyKpa.p10 - half && row.kpa <= supplyKpa.p90 + half;
  return { at: row.at, model: supplyKpa.p50 - row.kpa, line: line - row.kpa, within };
}

function rms(values: number[]): number {
  return Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);
}

describe('on a real supply outside the usual prior', { timeout: 120_000 }, () => {
  let told: Foretold[] = [];
  beforeAll(() => {
    told = follow();
  }, 120_000);

  it('the filter foretells the next reading better than a straight line through the last two', () => {
    const all = { model: rms(told.map((t) => t.model)), line: rms(told.map((t) => t.line)) };
    expect(all.model).toBeLessThan(all.line);
  });

  it('and does so from the second cycle on', () => {
    const second = told.filter((t) => t.at > 1500);
    expect(rms(second.map((t) => t.model))).toBeLessThan(rms(second.map((t) => t.line)));
  });

  it('its 80 % band holds at least 70 % of them', () => {
    expect(told.filter((t) => t.within).length / told.length).toBeGreaterThan(0.7);
  });

  it('it is not lost in the first rise: within 0.5 bar of every second reading', () => {
    const first = told.filter((t) => t.at > 1380 && t.at < 1520);
    expect(first.length).toBeGreaterThan(4);
    expect(first.filter((t) => Math.abs(t.model) < 50).length / first.length).toBeGreaterThan(0.5);
  });
});

describe('the model on the same supply', () => {
  it('swings between its cut-in and cut-out, up in about 100 s, down in about 1950 s', () => {
    const coach = createPracticeCoach({
      seed: 2,
      tire: { startKpa: 300, volumeL: 100 },
      engine: 'idle',
      governor: { cutInKpa: 807, cutOutKpa: 1009 },
      supplyKpa: 808,
      loaded: true,
      supplyL: 25,
      serviceL: 100,
      idleFlow: 2.85,
      leakPsiPerMinute: 0.71,
    });
    const cutOut = coach.advance(400).find((notice) => notice.type === 'cut-out')!.at;
    const cutIn = coach.advance(4000).find((notice) => notice.type === 'cut-in')!.at;
    expect(Math.abs(cutOut - 100)).toBeLessThan(15);
    expect(Math.abs(cutIn - cutOut - 1950)).toBeLessThan(200);
  });
});
