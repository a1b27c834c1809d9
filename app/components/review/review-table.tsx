import { type Column, DataTable } from '~/components/data-table';
import { formatPressure, gaugeKpa, type PressureUnit } from '~/units';
import { clockTime, sinceStart } from './review-time';
import type { TableLine } from './review-view';

export interface ReviewTableProps {
  lines: readonly TableLine[];
  unit: PressureUnit;
  timeZone: string;
}

/** The record as a table: the same figures as the chart, and what did not count. */
export function ReviewTable({ lines, unit, timeZone }: ReviewTableProps) {
  return (
    <div className="review-table">
      <DataTable
        caption={`Everything that was recorded. Times run from the start; the clock is that of ${zoneName(timeZone)}. Supply and tire are estimates.`}
        columns={columnsFor(unit, timeZone)}
        rows={lines}
        rowKey={({ id }) => id}
      />
    </div>
  );
}

function columnsFor(unit: PressureUnit, timeZone: string): Column<TableLine>[] {
  const figure = (kpa: number | undefined) =>
    kpa === undefined ? '–' : formatPressure(gaugeKpa(kpa), unit, { withUnit: false });
  return [
    { key: 'at', head: 'Time', figure: true, cell: ({ at }) => sinceStart(at) },
    {
      key: 'clock',
      head: 'Clock',
      figure: true,
      cell: ({ clockAt }) => clockTime(clockAt, timeZone),
    },
    { key: 'what', head: 'What happened', rowHead: true, cell: (line) => <What line={line} /> },
    {
      key: 'value',
      head: `Read, ${unit}`,
      figure: true,
      cell: ({ kpa }) => (kpa === undefined ? '' : figure(kpa)),
    },
    {
      key: 'supply',
      head: `Supply, ${unit}`,
      figure: true,
      cell: ({ supply }) => figure(supply?.p50),
    },
    { key: 'tire', head: `Tire, ${unit}`, figure: true, cell: ({ tire }) => figure(tire) },
  ];
}

const kindWords = { call: 'The screen said', reading: '', tap: '' };

function What({ line: { kind, words, fromCab, unused } }: { line: TableLine }) {
  return (
    <span data-kind={kind} data-unused={unused ? '' : undefined}>
      {kindWords[kind]} {words}
      {fromCab && <span className="quiet"> (cab)</span>}
      {unused && <em> ({unused})</em>}
    </span>
  );
}

/** "Denver": the city of a zone is what people know it by. */
const zoneName = (timeZone: string) => timeZone.split('/').at(-1)?.replaceAll('_', ' ') ?? timeZone;
