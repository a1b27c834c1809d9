import { type Column, DataTable } from '~/components/data-table';
import { type ColdCheck, type ColdVerdict, positionName } from '~/loads';
import type { TireState } from '~/queries/coach-overview.server';
import {
  formatPressure,
  formatPressureDifference,
  gaugeKpa,
  kpaDifference,
  type PressureUnit,
} from '~/units';
import { verdictWord, wantsAction } from '../rounds/verdict-words';

export interface TireTableProps {
  tires: readonly TireState[];
  /** Of the same tires in the same order. */
  check: ColdCheck;
  unit: PressureUnit;
}

type Row = TireState & { verdict: ColdVerdict; place: number };

/** Every tire with its last pressure, target, change and what it needs. */
export function TireTable({ tires, check, unit }: TireTableProps) {
  const rows = check.tires.flatMap(({ verdict }, place) => {
    const tire = tires[place];
    return tire ? [{ ...tire, verdict, place }] : [];
  });
  return <DataTable columns={columnsIn(unit)} rows={rows} rowKey={({ tireId }) => tireId} />;
}

function columnsIn(unit: PressureUnit): Column<Row>[] {
  const pressure = (kpa: number | null) =>
    kpa === null ? '–' : formatPressure(gaugeKpa(kpa), unit, { withUnit: false });
  const change = (kpa: number | null) =>
    kpa === null
      ? '–'
      : formatPressureDifference(kpaDifference(kpa), unit, { withUnit: false, sign: true });
  return [
    {
      key: 'tire',
      head: 'Tire',
      cell: ({ position }) => positionName(position),
      rowHead: true,
      sortBy: ({ place }) => place,
    },
    {
      key: 'cold',
      head: `Cold, ${unit}`,
      cell: ({ kpa }) => <b className="text-[19px]">{pressure(kpa)}</b>,
      figure: true,
      sortBy: ({ kpa }) => kpa ?? -1,
    },
    { key: 'target', head: 'Target', cell: ({ targetKpa }) => pressure(targetKpa), figure: true },
    {
      key: 'since',
      head: 'Since last',
      cell: ({ sinceLastKpa }) => change(sinceLastKpa),
      figure: true,
    },
    {
      key: 'month',
      head: 'A month',
      cell: ({ lossPerMonthKpa }) => change(lossPerMonthKpa === null ? null : -lossPerMonthKpa),
      figure: true,
      sortBy: ({ lossPerMonthKpa }) => -(lossPerMonthKpa ?? 0),
    },
    { key: 'word', head: <span className="only-heard">What it needs</span>, cell: VerdictCell },
  ];
}

const VerdictCell = ({ verdict }: Row) => (
  <span className={wantsAction(verdict) ? 'needs' : undefined}>{verdictWord(verdict)}</span>
);
