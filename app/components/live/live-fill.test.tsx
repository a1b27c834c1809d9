// @vitest-environment happy-dom
import { cleanup, fireEvent, render, screen, within } from '@testing-library/react';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { createPracticeSource, type PracticeSource } from '~/fill/practice-source';
import { practiceSituations, practiceStart } from '~/fill/practice-starts';
import { LiveFill } from './live-fill';

let clock = 0;
let source: PracticeSource;

beforeEach(() => {
  clock = 0;
  const [situation] = practiceSituations;
  if (!situation) throw new Error('no situation');
  const start = practiceStart(situation, 1, 'psi');
  source = createPracticeSource(start, () => clock, new Date(2026, 5, 1, 10, 0, 0));
  render(<LiveFill source={source} />);
});

afterEach(cleanup);

const key = (name: string) => screen.getByRole('button', { name });
const tapped = () => source.events().filter((event) => event.type !== 'call-shown');

function press(name: string) {
  fireEvent.pointerDown(key(name));
  fireEvent.pointerUp(key(name));
  fireEvent.click(key(name), { detail: 1 });
}

function typeValue(text: string) {
  press('Other value');
  fireEvent.change(screen.getByRole('textbox'), { target: { value: text } });
  press('Enter');
}

test('asks for the gauge first, and records the call that it showed', () => {
  expect(screen.getByRole('heading', { name: 'Read gauge' })).toBeDefined();
  expect(source.events()).toMatchObject([{ type: 'call-shown', call: 'read-supply' }]);
});

test('both live regions stand from the start, and only one speaks', () => {
  expect(screen.getByRole('status').textContent).toBe('Read gauge. Tap what it shows.');
  expect(screen.getByRole('alert').textContent).toBe('');
});

test('a press acts on release, with the time of the press-down', () => {
  clock = 2;
  fireEvent.pointerDown(key('It purged'));
  clock = 3.5;
  expect(tapped()).toEqual([]);
  fireEvent.click(key('It purged'), { detail: 1 });
  expect(tapped()).toMatchObject([{ type: 'cut-out', at: 2 }]);
});

test('a press that slid off records nothing', () => {
  fireEvent.pointerDown(key('It purged'));
  fireEvent.pointerLeave(key('It purged'));
  fireEvent.pointerUp(key('More'));
  expect(tapped()).toEqual([]);
});

test('a keyboard’s press counts as now, not as an older press-down', () => {
  clock = 1;
  fireEvent.pointerDown(key('It purged'));
  fireEvent.pointerLeave(key('It purged'));
  clock = 4;
  fireEvent.click(key('It purged'), { detail: 0 });
  expect(tapped()).toMatchObject([{ type: 'cut-out', at: 4 }]);
});

test('an offered value is recorded as offered, and can be taken back', () => {
  const row = screen.getAllByRole('button').filter((each) => /^\d+$/.test(each.textContent ?? ''));
  expect(row).toHaveLength(3);
  press(row[1]?.textContent ?? '');
  expect(tapped()).toMatchObject([{ type: 'supply-reading', how: 'offered' }]);
  press('Take back');
  expect(tapped().at(-1)).toMatchObject({ type: 'taken-back', of: tapped()[0]?.id });
});

test.each(['12..5', '1O5', ''])('“%s” is refused beside the field and kept', (text) => {
  typeValue(text);
  const field = screen.getByRole('textbox');
  expect(field.getAttribute('aria-invalid')).toBe('true');
  const problem = document.getElementById(field.getAttribute('aria-describedby') ?? '');
  expect(problem?.textContent).toMatch(/Type/);
  expect((field as HTMLInputElement).value).toBe(text);
  expect(tapped()).toEqual([]);
});

test('a value far from the forecast is asked about once, and recorded as it was typed', () => {
  typeValue('112');
  expect(tapped()).toMatchObject([{ type: 'supply-reading', how: 'typed' }]);
  typeValue('60');
  const question = screen.getByRole('alertdialog');
  expect(question.textContent).toContain('60 psi');
  expect(tapped()).toHaveLength(1);
  fireEvent.click(within(question).getByRole('button', { name: 'Yes, 60 psi' }), { detail: 1 });
  expect(tapped()).toHaveLength(2);
  expect(tapped()[1]).toMatchObject({ how: 'typed' });
  expect(screen.queryByRole('alertdialog')).toBeNull();
});

test('the pedal’s safety words come before the first pedal, also from behind More', () => {
  press('More');
  press('Pedal in use');
  expect(screen.getByText(/licence manual/)).toBeDefined();
  expect(tapped()).toEqual([]);
  press('I have read this');
  expect(tapped()).toMatchObject([{ type: 'lowering', by: 'pedal', on: true }]);
  press('More');
  press('Pedal let go');
  press('More');
  press('Pedal in use');
  expect(tapped()).toHaveLength(3);
});

test('ending from behind More is asked about', () => {
  press('More');
  press('End this fill');
  expect(source.ended()).toBe(false);
  press('Yes, end it');
  expect(source.ended()).toBe(true);
});
