// @vitest-environment happy-dom
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, expect, test } from 'vitest';
import { DataTable } from '../data-table';
import { ChoiceField } from './choice-field';
import { PressureField } from './field';
import { FormErrors } from './form-errors';

afterEach(cleanup);

test('a refused field keeps what was typed and is tied to its hint and its error', () => {
  render(
    <PressureField
      label="Target"
      name="target"
      unit="psi"
      hint="Cold."
      error="Type one like 104.5."
      defaultValue="12..5"
    />,
  );
  const field = screen.getByLabelText<HTMLInputElement>('Target');
  expect(field.value).toBe('12..5');
  expect(field.getAttribute('aria-invalid')).toBe('true');
  const described = field.getAttribute('aria-describedby')?.split(' ') ?? [];
  expect(described.map((id) => document.getElementById(id)?.textContent)).toEqual([
    'Cold.',
    'Type one like 104.5.',
  ]);
});

test('the summary takes the focus and leads to its fields', () => {
  render(<FormErrors errors={[{ name: 'target', message: 'Target: type a pressure.' }]} />);
  const summary = screen.getByRole('alert');
  expect(document.activeElement).toBe(summary);
  expect(screen.getByRole('link').getAttribute('href')).toBe('#field-target');
});

test('a form without errors has no summary', () => {
  const { container } = render(<FormErrors errors={[]} />);
  expect(container.textContent).toBe('');
});

test('choices keep what was ticked', () => {
  const choices = [
    { value: 'pedal', label: 'Pedal' },
    { value: 'drain', label: 'Drain' },
  ];
  render(
    <ChoiceField label="By" name="by" pick="many" choices={choices} defaultValue={['drain']} />,
  );
  expect(screen.getByLabelText<HTMLInputElement>('Drain').checked).toBe(true);
  expect(screen.getByLabelText<HTMLInputElement>('Pedal').checked).toBe(false);
});

test('a table sorts figures as figures, and says which way', () => {
  const rows = [{ psi: 98 }, { psi: 104 }, { psi: 12 }];
  const columns = [
    {
      key: 'psi',
      head: 'Cold, psi',
      cell: (row: { psi: number }) => row.psi,
      sortBy: (row: { psi: number }) => row.psi,
    },
  ];
  render(<DataTable columns={columns} rows={rows} rowKey={(row) => String(row.psi)} />);
  const shown = () => screen.getAllByRole('cell').map((cell) => cell.textContent);
  fireEvent.click(screen.getByRole('button'));
  expect(shown()).toEqual(['12', '98', '104']);
  fireEvent.click(screen.getByRole('button'));
  expect(shown()).toEqual(['104', '98', '12']);
  expect(screen.getByRole('columnheader').getAttribute('aria-sort')).toBe('descending');
});
