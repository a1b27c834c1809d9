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

type Row = TireState & { verdict: ColdVerdict };

/** Every tire with its last pressure, target, change and what it needs. */
export function TireTable({ tires, check, unit }: TireTableProps) {
  const rows = check.tires.flatMap(({ verdict }, place) => {
    const tire = tires[place];
    return tire ? [{ ...tire, verdict }] : [];
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
      cell: NameCell,
      rowHead: true,
    },
    {
      key: 'cold',
      head: `Cold, ${unit}`,
      cell: ({ kpa }) => <b className="text-[19px]">{pressure(kpa)}</b>,
      figure: true,
    },
    {
      key: 'target',
      head: 'Target',
      cell: ({ targetKpa }) => pressure(targetKpa),
      figure: true,
      className: 'max-sm:hidden',
    },
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
    },
    {
      key: 'word',
      head: <span className="only-heard">What it needs</span>,
      cell: VerdictCell,
      className: 'max-sm:hidden whitespace-nowrap',
    },
  ];
}

/** A phone has no room for the last column, so what a tire needs stands below its name. */
const NameCell = ({ position, verdict }: Row) => (
  <>
    {positionName(position)}
    {wantsAction(verdict) && (
      <span className="block sm:hidden">
        <span className="needs whitespace-nowrap">{verdictWord(verdict)}</span>
      </span>
    )}
  </>
);

const VerdictCell = ({ verdict }: Row) => (
  <span className={wantsAction(verdict) ? 'needs' : undefined}>{verdictWord(verdict)}</span>
);
