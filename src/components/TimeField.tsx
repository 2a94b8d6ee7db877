import { useState } from 'react';
import { Field, type FieldAbout } from './Field.tsx';

/**
 * A time of day as minutes after midnight, 24-hour clock. '9', '930', '9:30' and '9.30' all work;
 * `onChange` gives null while empty and NaN for what is no time.
 */
export function TimeField({
  label,
  hint,
  error,
  required,
  className,
  value,
  onChange,
  onBlur,
  disabled,
}: FieldAbout & {
  value: number | null;
  onChange: (minutes: number | null) => void;
  onBlur?: () => void;
  disabled?: boolean;
}) {
  const [typed, setTyped] = useState<string | null>(null);
  return (
    <Field {...{ label, hint, error, required, className }}>
      {(wiring) => (
        <input
          {...wiring}
          disabled={disabled}
          type="text"
          inputMode="numeric"
          autoComplete="off"
          placeholder="9:30"
          className="entry"
          value={typed ?? (value === null || Number.isNaN(value) ? '' : writeTime(value))}
          onChange={(event) => {
            setTyped(event.target.value);
            onChange(readTime(event.target.value));
          }}
          onBlur={() => {
            setTyped(null);
            onBlur?.();
          }}
        />
      )}
    </Field>
  );
}

/** 570 → '9:30'; 1440 → '24:00'. */
export function writeTime(minutes: number): string {
  return `${Math.floor(minutes / 60)}:${String(minutes % 60).padStart(2, '0')}`;
}

/** Minutes after midnight a person typed; null when empty, NaN when it is no time of a day. */
export function readTime(text: string): number | null {
  const clean = text.trim();
  if (clean === '') return null;
  const parts =
    /^(\d{1,2})[:.,h ](\d{2})$/.exec(clean) ??
    /^(\d{1,2})(\d{2})$/.exec(clean) ??
    /^(\d{1,2})$/.exec(clean);
  if (!parts) return Number.NaN;
  const hours = Number(parts[1]);
  const minutes = Number(parts[2] ?? 0);
  const total = hours * 60 + minutes;
  return minutes < 60 && total <= 1440 ? total : Number.NaN;
}
