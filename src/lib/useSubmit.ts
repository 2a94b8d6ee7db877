import { useRef, useState, type FormEvent } from 'react';
import type { FieldPath, FieldValues, UseFormReturn } from 'react-hook-form';

/** What the form knows of the server's refusal. */
export interface SubmitState {
  onSubmit: (event: FormEvent) => void;
  busy: boolean;
  /** The error, or words when fields say what is wrong. */
  failure: unknown;
  /** Complaints about paths no field of this form has. */
  strayFields: Record<string, string>;
}

/**
 * Submits once however often the button is pressed, and puts the server's complaints on the fields
 * they name. `send` gets the schema's output.
 */
export function useSubmit<Input extends FieldValues, Output extends FieldValues>(
  form: UseFormReturn<Input, unknown, Output>,
  send: (values: Output) => Promise<void> | void,
): SubmitState {
  const running = useRef(false);
  const [busy, setBusy] = useState(false);
  const [failure, setFailure] = useState<unknown>(null);
  const [strayFields, setStrayFields] = useState<Record<string, string>>({});
  const run = async (values: Output) => {
    if (running.current) return;
    running.current = true;
    setBusy(true);
    setFailure(null);
    setStrayFields({});
    try {
      await send(values);
    } catch (error) {
      const fields = fieldsOf(error);
      setStrayFields(placeErrors(form, fields));
      // The fields say it better than a message that names them by their code.
      setFailure(
        Object.keys(fields).length > 0 ? 'Nothing was saved. Look at the marked fields.' : error,
      );
    } finally {
      running.current = false;
      setBusy(false);
    }
  };
  return {
    onSubmit: (event) => {
      // A form in a dialog must not submit a form around it.
      event.stopPropagation();
      void form.handleSubmit(run)(event);
    },
    busy,
    failure,
    strayFields,
  };
}

function placeErrors<Input extends FieldValues, Output extends FieldValues>(
  form: UseFormReturn<Input, unknown, Output>,
  fields: Record<string, string>,
): Record<string, string> {
  const known = form.getValues() as Record<string, unknown>;
  const stray: Record<string, string> = {};
  for (const [path, message] of Object.entries(fields)) {
    const own = path.replace(/^body\./, '');
    if (own.split('.')[0]! in known)
      form.setError(own as FieldPath<Input>, { type: 'server', message }, { shouldFocus: true });
    else stray[own] = message;
  }
  return stray;
}

function fieldsOf(error: unknown): Record<string, string> {
  const fields = (error as { fields?: unknown } | null)?.fields;
  return typeof fields === 'object' && fields !== null ? (fields as Record<string, string>) : {};
}
