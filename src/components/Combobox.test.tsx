// @vitest-environment happy-dom
import { useState } from 'react';
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import { Combobox, type ComboOption } from './Combobox.tsx';

const streets: ComboOption[] = ['Heron Lane', 'Heron Way', 'Quay Street'].map((label) => ({
  key: label,
  label,
}));

function Streets({ onPick }: { onPick: (option: ComboOption) => void }) {
  const [text, setText] = useState('');
  return (
    <Combobox
      label="Street"
      text={text}
      onText={setText}
      options={text ? streets.filter(({ label }) => label.includes(text)) : []}
      onPick={(option) => {
        setText(option.label);
        onPick(option);
      }}
      emptyWords="No such street."
    />
  );
}

afterEach(cleanup);

test('arrows walk the matches, Enter picks the active one', async () => {
  const onPick = vi.fn();
  render(<Streets onPick={onPick} />);
  const entry = screen.getByRole('combobox', { name: 'Street' });
  await userEvent.type(entry, 'Heron');
  expect(entry.getAttribute('aria-expanded')).toBe('true');
  expect(screen.getAllByRole('option').map((option) => option.textContent)).toEqual([
    'Heron Lane',
    'Heron Way',
  ]);
  await userEvent.keyboard('{ArrowDown}{ArrowDown}');
  const active = entry.getAttribute('aria-activedescendant')!;
  expect(document.getElementById(active)?.textContent).toBe('Heron Way');
  await userEvent.keyboard('{Enter}');
  expect(onPick).toHaveBeenCalledExactlyOnceWith({ key: 'Heron Way', label: 'Heron Way' });
  expect(entry.getAttribute('aria-expanded')).toBe('false');
});

test('ArrowUp from nowhere goes to the last match', async () => {
  render(<Streets onPick={() => undefined} />);
  const entry = screen.getByRole('combobox');
  await userEvent.type(entry, 'Heron');
  await userEvent.keyboard('{ArrowUp}');
  const active = entry.getAttribute('aria-activedescendant')!;
  expect(document.getElementById(active)?.textContent).toBe('Heron Way');
});

test('no match is said, and Escape closes the list before anything else', async () => {
  render(<Streets onPick={() => undefined} />);
  const entry = screen.getByRole('combobox');
  await userEvent.type(entry, 'Xyz');
  expect(screen.getAllByText('No such street.').length).toBeGreaterThan(0);
  await userEvent.keyboard('{Escape}');
  expect(entry.getAttribute('aria-expanded')).toBe('false');
});
