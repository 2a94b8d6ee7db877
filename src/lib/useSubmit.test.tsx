// @vitest-environment happy-dom
import { cleanup, render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import { z } from 'zod';
import { errorWords } from './errorWords.ts';
import { useSubmit } from './useSubmit.ts';
import { useZodForm } from './useZodForm.ts';

const schema = z.object({
  name: z.string().trim().min(1, 'must not be empty'),
  phone: z.string().nullable().default(null),
});

function Form({ send }: { send: (values: { name: string }) => Promise<void> }) {
  const form = useZodForm(schema, { name: '', phone: null });
  const submit = useSubmit(form, send);
  return (
    <form onSubmit={submit.onSubmit} noValidate>
      <input aria-label="Name" {...form.register('name')} />
      <p data-testid="error">{form.formState.errors.name?.message}</p>
      <p data-testid="stray">{JSON.stringify(submit.strayFields)}</p>
      <p data-testid="failure">{submit.failure ? errorWords(submit.failure) : ''}</p>
      <button type="submit">Save</button>
    </form>
  );
}

afterEach(cleanup);

test('a bad value is said on its field and nothing is sent', async () => {
  const send = vi.fn(async () => undefined);
  render(<Form send={send} />);
  await userEvent.click(screen.getByText('Save'));
  expect(screen.getByTestId('error').textContent).toBe('must not be empty');
  expect(send).not.toHaveBeenCalled();
});

test('pressing twice sends once, with the schema’s output', async () => {
  let finish = () => undefined as void;
  const send = vi.fn(() => new Promise<void>((resolve) => (finish = resolve)));
  render(<Form send={send} />);
  await userEvent.type(screen.getByLabelText('Name'), ' Otter ');
  await userEvent.dblClick(screen.getByText('Save'));
  await waitFor(() => expect(send).toHaveBeenCalledTimes(1));
  expect(send).toHaveBeenCalledWith({ name: 'Otter', phone: null });
  finish();
});

test('the server’s complaints land on their fields, the rest is kept to be shown', async () => {
  const refusal = Object.assign(new Error('Two fields need another look.'), {
    fields: { name: 'is already taken', siteId: 'is not a site of yours' },
  });
  render(<Form send={() => Promise.reject(refusal)} />);
  await userEvent.type(screen.getByLabelText('Name'), 'Otter');
  await userEvent.click(screen.getByText('Save'));
  await waitFor(() => expect(screen.getByTestId('error').textContent).toBe('is already taken'));
  expect(screen.getByTestId('stray').textContent).toBe('{"siteId":"is not a site of yours"}');
  expect(screen.getByTestId('failure').textContent).toBe(
    'Nothing was saved. Look at the marked fields.',
  );
});
