// @vitest-environment happy-dom
import { useState } from 'react';
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import { findStyle } from '#shared/grooming/styles.ts';
import type { Region } from '#shared/grooming/types.ts';
import { BodyDiagram } from './BodyDiagram.tsx';
import { regionOrder } from './bodyShapes.ts';

afterEach(cleanup);

function Picker({ onPick }: { onPick: (region: Region) => void }) {
  const [picked, setPicked] = useState<Region | null>(null);
  return (
    <BodyDiagram
      species="dog"
      cuts={findStyle('lamb-legs').cuts}
      picked={picked}
      onPick={(region) => {
        setPicked(region);
        onPick(region);
      }}
    />
  );
}

test('every region is a button that says its tool, direction and length', () => {
  render(<Picker onPick={vi.fn()} />);
  expect(screen.getAllByRole('button')).toHaveLength(regionOrder.length);
  // #5F leaves 6.3 mm against growth and about twice as much with it.
  expect(screen.getByRole('button', { name: 'back, blade 5F, with growth, 12.6 mm' })).toBeTruthy();
  expect(screen.getByRole('button', { name: 'front legs, scissors, 40 mm by eye' })).toBeTruthy();
  expect(screen.getByRole('button', { name: 'sanitary area, not touched' })).toBeTruthy();
});

test('arrows walk from head to tail and round, Home and End jump, Enter picks', async () => {
  const user = userEvent.setup();
  const onPick = vi.fn();
  render(<Picker onPick={onPick} />);
  const focused = () => document.activeElement?.getAttribute('aria-label')?.split(',')[0];
  screen.getByRole('button', { name: /^head/ }).focus();
  await user.keyboard('{ArrowRight}{ArrowDown}');
  expect(focused()).toBe('neck');
  await user.keyboard('{ArrowLeft}{ArrowUp}{ArrowUp}');
  expect(focused()).toBe('sanitary area');
  await user.keyboard('{Home}');
  expect(focused()).toBe('head');
  await user.keyboard('{End}{ArrowRight}');
  expect(focused()).toBe('head');
  await user.keyboard('{ArrowRight}{Enter}');
  expect(onPick).toHaveBeenLastCalledWith('ears');
  expect(screen.getByRole('button', { name: /^ears/ }).getAttribute('aria-pressed')).toBe('true');
  await user.keyboard('{ArrowRight} ');
  expect(onPick).toHaveBeenLastCalledWith('neck');
});

test('Tab walks in the same order', async () => {
  const user = userEvent.setup();
  render(<Picker onPick={vi.fn()} />);
  await user.tab();
  expect(document.activeElement?.getAttribute('aria-label')).toMatch(/^head/);
  await user.tab();
  expect(document.activeElement?.getAttribute('aria-label')).toMatch(/^ears/);
});

test('to look at only, it is one picture with the whole plan in words', () => {
  render(<BodyDiagram species="cat" cuts={findStyle('cat-belly-clear').cuts} />);
  expect(screen.queryByRole('button')).toBeNull();
  const said = screen.getByRole('img').getAttribute('aria-label');
  expect(said).toContain('Cut plan of the cat');
  expect(said).toContain('belly, blade 10, with growth, 3 mm');
});
