/**
 * What is kept of a coach: the air profile (lasting parameters, the prior of the next fill) and
 * the supply's state (the same with pressures, for the next tire of the round). Both are weighted
 * samples thinned to equal weights, since conductance over volume matters more than either alone.
 */
import { normal, uniform } from './arithmetic';
import { createMembers, type Field, LASTING_FIELDS, type Members } from './coach';
import type { AirProfile, FillSetup, RigKey, SupplyState } from './contract';
import { Ensemble } from './ensemble';
import { drawLasting, drawSupply, drawWheel, reconcileGovernor } from './priors';
import { jitterMember, LEAST_WIDTHS, pickByWeight, type Widths } from './renewal';

export const PROFILE_SCHEMA = 1;
const KEPT_MEMBERS = 64;

const SUPPLY_FIELDS: readonly Field[] = [
  'supplyAbs',
  'serviceAbs',
  'accessoryAbs',
  'loaded',
  'speed',
  'sinceSwitch',
];

/** Share of members at the start of a fill that come from each source; the rest is broad prior. */
const FROM_SUPPLY = 0.78;
const FROM_PROFILE = 0.8;

/** Old knowledge fades: what is taken over is spread a little. */
const CARRIED_WIDTHS: Widths = {
  scaled: LEAST_WIDTHS.scaled.map((width) => 2 * width),
  core: 0.05,
  cutIn: 3,
  cutOut: 3,
};

function keyOf(rig: FillSetup['rig']): RigKey {
  return { hose: rig?.hose, chuck: rig?.chuck, gauge: rig?.gaugeName };
}

/** Seven figures are more than any parameter is known to, and keep the JSON small. */
function shorten(x: number): number {
  if (x === 0 || !Number.isFinite(x)) return 0;
  let scale = 1;
  while (Math.abs(x) * scale < 100000) scale *= 10;
  return Math.round(x * scale) / scale;
}

function sample(e: Ensemble, fields: readonly Field[]): number[][] {
  const kept = createMembers(KEPT_MEMBERS);
  pickByWeight(e.members, e.weights, kept, 0.5);
  const rows: number[][] = [];
  for (let i = 0; i < kept.n; i++) rows.push(fields.map((field) => shorten(kept[field][i]!)));
  return rows;
}

export function profileOf(e: Ensemble, setup: FillSetup): AirProfile {
  return {
    schema: PROFILE_SCHEMA,
    key: keyOf(setup.rig),
    fills: (setup.profile?.fills ?? 0) + 1,
    fields: [...LASTING_FIELDS],
    members: sample(e, LASTING_FIELDS),
  };
}

export function supplyOf(e: Ensemble): SupplyState {
  const fields = [...LASTING_FIELDS, ...SUPPLY_FIELDS];
  return { schema: PROFILE_SCHEMA, fields, members: sample(e, fields) };
}

function readInto(
  m: Members,
  i: number,
  kept: { fields: string[]; members: number[][] },
  row: number,
): void {
  kept.fields.forEach((field, k) => {
    const column = m[field as Field];
    const value = kept.members[row]?.[k];
    if (column instanceof Float64Array && value !== undefined) column[i] = value;
  });
}

/** The ensemble at the start of a fill: what is known, jittered, with fresh members mixed in. */
export function startEnsemble(n: number, setup: FillSetup): Ensemble {
  const atmosphere = setup.atmosphereKpa ?? 101.325;
  const { tire } = setup;
  const e = new Ensemble(n, setup.seed ?? 1, atmosphere, tire.volumeL, tire.slowValve ?? false);
  const m = e.members;
  const supply = setup.supply?.schema === PROFILE_SCHEMA ? setup.supply : undefined;
  const profile = setup.profile?.schema === PROFILE_SCHEMA ? setup.profile : undefined;
  for (let i = 0; i < n; i++) {
    drawLasting(m, i, e.draws);
    drawSupply(m, i, e.draws, atmosphere);
    const pick = uniform(e.draws);
    const row = uniform(e.draws);
    if (supply && pick < FROM_SUPPLY) {
      readInto(m, i, supply, Math.floor(row * supply.members.length));
      jitterMember(m, i, e.draws, CARRIED_WIDTHS);
    } else if (profile && pick < FROM_PROFILE) {
      takeProfile(e, i, setup, Math.floor(row * profile.members.length));
    }
    if (supply) keepPressure(e, i, supply, Math.floor(row * supply.members.length));
    drawWheel(m, i, e.draws, tire.volumeL, tire.slowValve ?? false);
    m.tireAbs[i] = Math.max(0, tire.startKpa + 1.8 * normal(e.draws)) + atmosphere;
    reconcileGovernor(m, i, e.draws, atmosphere);
  }
  return e;
}

/** A fresh member in a round still has the supply that the round has. */
function keepPressure(e: Ensemble, i: number, supply: SupplyState, row: number): void {
  const columns = SUPPLY_FIELDS.map((field) => supply.fields.indexOf(field));
  SUPPLY_FIELDS.forEach((field, k) => {
    const value = supply.members[row]?.[columns[k]!];
    if (value !== undefined) e.members[field][i] = value;
  });
}

/** What was learned with another hose, chuck or gauge is not taken over. */
function takeProfile(e: Ensemble, i: number, setup: FillSetup, row: number): void {
  const m = e.members;
  const profile = setup.profile!;
  const fresh = {
    hoseC: m.hoseC[i]!,
    gaugeShare: m.gaugeShare[i]!,
    chuckC: m.chuckC[i]!,
    wheelBias: m.wheelBias[i]!,
  };
  readInto(m, i, profile, row);
  const now = keyOf(setup.rig);
  if (now.hose !== profile.key.hose) {
    m.hoseC[i] = fresh.hoseC;
    m.gaugeShare[i] = fresh.gaugeShare;
  }
  if (now.chuck !== profile.key.chuck) m.chuckC[i] = fresh.chuckC;
  if (now.gauge !== profile.key.gauge) m.wheelBias[i] = fresh.wheelBias;
  m.deadCompressor[i] = 0;
  jitterMember(m, i, e.draws, CARRIED_WIDTHS);
}
