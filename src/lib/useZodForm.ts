import { useForm, type DefaultValues, type FieldErrors, type FieldValues } from 'react-hook-form';
import type { z } from 'zod';

/**
 * react-hook-form checked by a zod schema of the contract. Values in the form are the schema's
 * input; `handleSubmit` hands on its output. Errors carry the schema's own words, by path.
 */
export function useZodForm<Input extends FieldValues, Output extends FieldValues>(
  schema: z.ZodType<Output, Input>,
  defaultValues: DefaultValues<Input>,
) {
  return useForm<Input, unknown, Output>({
    defaultValues,
    mode: 'onTouched',
    resolver: async (values) => {
      const parsed = await schema.safeParseAsync(values);
      if (parsed.success) return { values: parsed.data, errors: {} };
      return { values: {}, errors: nestErrors<Input>(parsed.error.issues) };
    },
  });
}

interface Issue {
  path: PropertyKey[];
  message: string;
}

function nestErrors<Input extends FieldValues>(issues: readonly Issue[]): FieldErrors<Input> {
  const errors: Record<PropertyKey, unknown> = {};
  for (const issue of issues) {
    const path = issue.path.length > 0 ? issue.path : ['root'];
    let at = errors;
    path.forEach((key, index) => {
      if (index === path.length - 1) at[key] ??= { type: 'zod', message: sentence(issue.message) };
      else at = (at[key] ??= {}) as Record<PropertyKey, unknown>;
    });
  }
  return errors as FieldErrors<Input>;
}

/** zod's own words for a missing value say little to a person. */
function sentence(message: string): string {
  if (/^Invalid input: expected \w+, received (null|undefined|NaN)/.test(message))
    return 'must be filled in';
  if (message.startsWith('Invalid input: expected number')) return 'must be a number';
  return message.startsWith('Invalid input') ? 'must be chosen' : message;
}
