import { Link } from 'react-router';
import { type Column, DataTable } from '~/components/data-table';
import { positionName } from '~/loads';
import type { PastFill, PastReading, PastRound } from '~/queries/history.server';
import {
  celsius,
  formatPressure,
  formatPressureDifference,
  formatTemperature,
  gaugeKpa,
  kpaDifference,
  type PressureUnit,
} from '~/units';
import { placeUnits } from '../rounds/place-units';
import { dayWords } from './coach-words';

export interface PastRoundProps {
  round: PastRound;
  unit: PressureUnit;
  now: Date;
}

type Row = PastReading & { fills: PastFill[] };

/** One round of the history: what was read against the target of its day, and what was filled. */
export function PastRoundSection({ round, unit, now }: PastRoundProps) {
  const { id, readings, fills } = round;
  const day = dayWords(round.startedAt, now, round.timeZone);
  const warmth = formatTemperature(celsius(round.ambientC), placeUnits(unit).temperature);
  const rows = readings.map((reading) => ({
    ...reading,
    fills: fills.filter(({ position }) => position === reading.position),
  }));
  return (
    <section>
      <h2>
        <Link to={`/rounds/${id}`}>{day}</Link>
      </h2>
      <p className="quiet mb-3">
        {[round.place, warmth, round.closed ? '' : 'still open'].filter(Boolean).join(' · ')}
      </p>
      {rows.length === 0 ? (
        <p>No tire was read.</p>
      ) : (
        <DataTable
          columns={columnsIn(unit, fills.length > 0)}
          rows={rows}
          rowKey={({ position }) => position}
        />
      )}
    </section>
  );
}

function columnsIn(unit: PressureUnit, withFills: boolean): Column<Row>[] {
  const pressure = (kpa: number) => formatPressure(gaugeKpa(kpa), unit, { withUnit: false });
  const off = ({ kpa, targetKpa }: Row) =>
    formatPressureDifference(kpaDifference(kpa - targetKpa), unit, { withUnit: false, sign: true });
  const columns: Column<Row>[] = [
    { key: 'tire', head: 'Tire', cell: ({ position }) => positionName(position), rowHead: true },
    {
      key: 'cold',
      head: `Read, ${unit}`,
      cell: ({ kpa, warm }) => (
        <>
          {warm && <span className="quiet">warm </span>}
          <b>{pressure(kpa)}</b>
        </>
      ),
      figure: true,
    },
    { key: 'target', head: 'Target', cell: ({ targetKpa }) => pressure(targetKpa), figure: true },
    { key: 'off', head: 'Off by', cell: off, figure: true, className: 'max-sm:hidden' },
  ];
  return withFills ? [...columns, fillColumn(unit)] : columns;
}

const fillColumn = (unit: PressureUnit): Column<Row> => ({
  key: 'fill',
  head: 'Fill',
  cell: ({ fills }) => fills.map((fill) => <FillLink key={fill.id} fill={fill} unit={unit} />),
});

const endWords = { done: 'to', stopped: 'stopped at', 'cannot-reach': 'could not reach, left at' };

function FillLink({ fill, unit }: { fill: PastFill; unit: PressureUnit }) {
  const { id, how, endKpa } = fill;
  if (how === null) return <Link to={`/fills/${id}`}>open</Link>;
  const end = endKpa === null ? 'not gauged' : formatPressure(gaugeKpa(endKpa), unit);
  return (
    <Link className="block" to={`/fills/${id}/review`}>
      {endKpa === null ? end : `${endWords[how]} ${end}`}
    </Link>
  );
}
