// @vitest-environment happy-dom
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, test } from 'vitest';
import { createPet } from '#shared/api/pets.ts';
import { useZodForm } from '#src/lib/useZodForm.ts';
import { MatPlaces } from './MatPlaces.tsx';
import { petStart } from './petStart.ts';

afterEach(cleanup);

function Shown() {
  const form = useZodForm(createPet.body, petStart(null, null, 2026));
  return (
    <>
      <MatPlaces control={form.control} />
      <output>{JSON.stringify(form.watch('mattingByRegion'))}</output>
    </>
  );
}

test('a place named is kept with its level, and the last one taken back is none at all', async () => {
  const user = userEvent.setup();
  render(<Shown />);
  const told = () => JSON.parse(screen.getByRole('status').textContent) as unknown;
  expect(screen.getAllByRole('combobox')).toHaveLength(10);
  expect(told()).toBeNull();
  await user.selectOptions(screen.getByLabelText('Ears'), 'Heavy');
  await user.selectOptions(screen.getByLabelText('Front legs'), 'Light');
  expect(told()).toEqual({ ears: 3, foreLegs: 1 });
  await user.selectOptions(screen.getByLabelText('Ears'), 'None');
  await user.selectOptions(screen.getByLabelText('Front legs'), 'None');
  expect(told()).toBeNull();
});
