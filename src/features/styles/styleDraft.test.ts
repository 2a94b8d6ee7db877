import { expect, test } from 'vitest';
import type { StyleShape } from '#shared/api/styles.ts';
import { findStyle } from '#shared/grooming/styles.ts';
import { changeDraft, ownParts, startDraft, styleOf } from './styleDraft.ts';

const teddy = findStyle('teddy') as StyleShape;

test('an untouched draft has nothing of its own', () => {
  expect(ownParts(startDraft(teddy, 'ears long'), teddy)).toEqual({
    ownCuts: null,
    ownFinish: null,
    ownServices: null,
    ownPlanB: null,
  });
});

test('only what differs is the pet’s own; a region taken out of the style is kept long', () => {
  let draft = startDraft(teddy, '');
  draft = changeDraft(draft, { kind: 'cut', region: 'tail', cut: null });
  draft = changeDraft(draft, {
    kind: 'cut',
    region: 'back',
    cut: { tool: 'comb', lengthTenthsMm: 190, direction: 'with' },
  });
  draft = changeDraft(draft, { kind: 'fields', fields: { finish: 'full' } });
  const own = ownParts(draft, teddy);
  expect(own.ownFinish).toBe('full');
  expect(own.ownCuts).toEqual({
    tail: { tool: 'leave' },
    back: { tool: 'comb', lengthTenthsMm: 190, direction: 'with' },
  });
  expect(own.ownServices).toBeNull();
});

test('services in another order are the same; plan B is completed for new ones', () => {
  let draft = changeDraft(startDraft(teddy, ''), {
    kind: 'service',
    service: 'bath',
    wanted: false,
  });
  draft = changeDraft(draft, { kind: 'service', service: 'bath', wanted: true });
  expect(ownParts(draft, teddy).ownServices).toBeNull();
  draft = changeDraft(draft, { kind: 'service', service: 'teeth', wanted: true });
  expect(ownParts(draft, teddy).ownServices).toContain('teeth');
  expect(styleOf(draft).planB.services.teeth).toBe('leave');
});

test('beginning from another style keeps the notes', () => {
  const draft = changeDraft(startDraft(teddy, 'ears long'), {
    kind: 'start',
    style: findStyle('lamb-legs') as StyleShape,
  });
  expect(draft).toMatchObject({ styleId: 'lamb-legs', notes: 'ears long' });
});
