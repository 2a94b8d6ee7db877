// @vitest-environment happy-dom
import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, expect, test } from 'vitest';
import type { Offer } from '#shared/api/forecasts.ts';
import { OfferList } from './OfferList.tsx';

afterEach(cleanup);

const offer: Offer = {
  date: '2026-05-19',
  startMinutes: 540,
  endMinutes: 660,
  vanId: 'curlew',
  vanName: 'Curlew',
  groomerName: 'Tobi',
  driveSecondsMore: 240,
  rough: false,
  onTimePermille: 940,
  othersOnTimePermille: 960,
};

test('a window with its van, its chance and what it costs in driving', () => {
  render(<OfferList offers={[offer]} noOfferWords={null} fresh />);
  expect(screen.getByRole('listitem').textContent).toBe(
    'Tue 19 May 9:00–11:00Curlew, Tobi · kept 94 in 1004 min more driving',
  );
});

test('a weaker promise after it is told, rough driving is marked, nothing is certain', () => {
  const other = { ...offer, rough: true, onTimePermille: 1000, othersOnTimePermille: 810 };
  render(<OfferList offers={[other]} noOfferWords={null} fresh />);
  const words = screen.getByRole('listitem').textContent;
  expect(words).toContain('kept 99 in 100, those after it 81');
  expect(words).toContain('4 min more driving, rough');
});

test('without a window it says why', () => {
  render(<OfferList offers={[]} noOfferWords="No van has room in four weeks." fresh />);
  expect(screen.getByText('No van has room in four weeks.')).toBeTruthy();
});
