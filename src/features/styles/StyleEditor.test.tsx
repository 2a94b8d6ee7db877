// @vitest-environment happy-dom
import { cleanup, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { afterEach, expect, test, vi } from 'vitest';
import type { StyleShape } from '#shared/api/styles.ts';
import { findStyle } from '#shared/grooming/styles.ts';
import { summaryWords } from '#shared/grooming/explain.ts';
import { forecastPet } from '#shared/grooming/forecastPet.ts';
import type { PetFacts } from '#shared/grooming/types.ts';
import { startDraft, type StyleDraft } from './styleDraft.ts';
import { StyleEditor } from './StyleEditor.tsx';

const fern: PetFacts = {
  species: 'dog',
  breedId: 'labradoodle',
  weightGrams: 22_000,
  ageYears: 4,
  coatState: { matting: 0, undercoatLoad: 0, soil: 0, lengthTenthsMm: null },
  temperament: 'calm',
  cautions: [],
  firstVisit: false,
  weeksSinceLast: 6,
};
const lambLegs = findStyle('lamb-legs') as StyleShape;

afterEach(cleanup);

function show(onSave: (draft: StyleDraft) => Promise<void> = async () => {}) {
  const editor = (
    <StyleEditor
      start={startDraft(lambLegs, '')}
      base={() => lambLegs}
      facts={fern}
      petName="Fern"
      saveWords="Save as version 2"
      onSave={onSave}
      head={() => null}
      foot={() => null}
    />
  );
  render(<RouterProvider router={createMemoryRouter([{ path: '/', element: editor }])} />);
  return userEvent.setup();
}

const sum = () => screen.getByRole('status').querySelector('b')?.textContent;

test('the minutes follow a region’s new tool at once', async () => {
  const user = show();
  const before = forecastPet(fern, lambLegs);
  expect(sum()).toBe(summaryWords(before));
  await user.click(screen.getByRole('button', { name: /^head, scissors/ }));
  const row = screen.getByRole('group', { name: 'Cut of the head' });
  await user.click(within(row).getByRole('radio', { name: 'Blade' }));
  const after = forecastPet(fern, {
    ...lambLegs,
    cuts: { ...lambLegs.cuts, head: { tool: 'blade', lengthTenthsMm: 32, direction: 'with' } },
  });
  // A clipped face is quicker than a scissored one.
  expect(after.medianSeconds).toBeLessThan(before.medianSeconds - 120);
  expect(sum()).toBe(summaryWords(after));
  expect(screen.getByText(/less than the saved style/)).toBeTruthy();
});

test('a region picked on the body opens its row with the focus in it; Escape gives it back', async () => {
  const user = show();
  screen.getByRole('button', { name: /^back, blade/ }).focus();
  await user.keyboard('{Enter}');
  const row = screen.getByRole('group', { name: 'Cut of the back' });
  expect(row.contains(document.activeElement)).toBe(true);
  await user.selectOptions(within(row).getByLabelText('Blade', { selector: 'select' }), '95');
  expect(screen.getByRole('button', { name: 'back, blade 4F, with growth, 19 mm' })).toBeTruthy();
  await user.keyboard('{Escape}');
  expect(screen.queryByRole('group', { name: 'Cut of the back' })).toBeNull();
  expect(document.activeElement?.getAttribute('aria-expanded')).toBe('false');
});

test('comb passes say what they save of the scissors, borders what is blended', () => {
  show();
  expect(screen.getByText(/pass(es)? saves? .* of scissors/)).toBeTruthy();
  expect(screen.getByText(/back to (front|back) legs 12\.6 → 40 mm/)).toBeTruthy();
});

test('what is saved is the draft with a whole plan B', async () => {
  const onSave = vi.fn<(draft: StyleDraft) => Promise<void>>(async () => {});
  const user = show(onSave);
  await user.click(screen.getByRole('checkbox', { name: 'teeth brushed' }));
  await user.click(screen.getByRole('radio', { name: 'teeth brushed: if the pet allows' }));
  await user.click(screen.getByRole('button', { name: 'Save as version 2' }));
  expect(onSave).toHaveBeenCalledOnce();
  const saved = onSave.mock.calls[0]![0];
  expect(saved.services).toContain('teeth');
  expect(saved.planB.services).toMatchObject({ teeth: 'ifAllowed', nails: 'must' });
  expect(saved.planB.regions).toMatchObject({ tail: 'leave' });
});

test('a refused save says why and keeps what was edited', async () => {
  const user = show(async () => {
    throw new Error('The style is used by another version now.');
  });
  await user.click(screen.getByRole('checkbox', { name: 'teeth brushed' }));
  await user.click(screen.getByRole('button', { name: 'Save as version 2' }));
  expect((await screen.findByRole('alert')).textContent).toContain('used by another version');
  expect(screen.getByRole<HTMLInputElement>('checkbox', { name: 'teeth brushed' }).checked).toBe(
    true,
  );
});
