import { Link } from 'react-router';
import type { Column } from '~/components/data-table';
import { positionName } from '~/loads';
import type { FittedTire } from '~/queries/fitted-tires.server';
import { formatPressure, formatVolume, gaugeKpa, litres, type PressureUnit } from '~/units';
import { dayWords } from './coach-words';

interface Reader {
  unit: PressureUnit;
  now: Date;
  mayEdit: boolean;
}

/** What is known of each tire; the owner finds the way to change it at the end. */
export function tireColumns({ unit, now, mayEdit }: Reader): Column<FittedTire>[] {
  const pressure = (kpa: number) => formatPressure(gaugeKpa(kpa), unit, { withUnit: false });
  const columns: Column<FittedTire>[] = [
    { key: 'tire', head: 'Tire', cell: ({ position }) => positionName(position), rowHead: true },
    { key: 'size', head: 'Size', cell: ({ size }) => size },
    {
      key: 'sidewall',
      head: `Sidewall limit, ${unit}`,
      cell: ({ sidewallLimitKpa }) => pressure(sidewallLimitKpa),
      figure: true,
    },
    {
      key: 'wheel',
      head: `Wheel limit, ${unit}`,
      cell: ({ wheelLimitKpa }) => pressure(wheelLimitKpa),
      figure: true,
    },
    {
      key: 'volume',
      head: 'Air, L',
      cell: ({ volumeL }) => formatVolume(litres(volumeL), { withUnit: false }),
      figure: true,
    },
    {
      key: 'source',
      head: 'Volume',
      cell: ({ volumeSource }) => (volumeSource === 'typed' ? 'typed' : 'by its size'),
    },
    { key: 'since', head: 'Here since', cell: ({ fittedFrom }) => dayWords(fittedFrom, now) },
  ];
  if (!mayEdit) return columns;
  return [
    ...columns,
    { key: 'change', head: <span className="only-heard">Change</span>, cell: Change },
  ];
}

const Change = ({ position }: FittedTire) => (
  <Link className="inline-flex min-h-11 items-center" to={`?tire=${position}`}>
    Change<span className="only-heard"> {positionName(position)}</span>
  </Link>
);
