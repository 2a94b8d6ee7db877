import { useState, type ReactNode } from 'react';
import { Field, type FieldAbout } from './Field.tsx';

/**
 * A number, null while empty. Typed as text so that '12,5' works and a wheel cannot change it.
 * `value` and `onChange` carry the number itself; use it with react-hook-form's Controller.
 */
export function NumberField({
  label,
  hint,
  error,
  required,
  className,
  unit,
  value,
  onChange,
  onBlur,
  decimals = 0,
  disabled,
  name,
}: FieldAbout & {
  unit?: ReactNode;
  value: number | null;
  onChange: (value: number | null) => void;
  onBlur?: () => void;
  decimals?: number;
  disabled?: boolean;
  name?: string;
}) {
  const [typed, setTyped] = useState<string | null>(null);
  const shown = value === null || Number.isNaN(value) ? '' : String(round(value, decimals));
  return (
    <Field {...{ label, hint, error, required, className }}>
      {(wiring) => (
        <div className="relative">
          <input
            {...wiring}
            name={name}
            disabled={disabled}
            type="text"
            inputMode={decimals > 0 ? 'decimal' : 'numeric'}
            autoComplete="off"
            className="entry"
            style={unit ? { paddingRight: `${String(unit).length * 0.6 + 1.5}em` } : undefined}
            value={typed ?? shown}
            onChange={(event) => {
              setTyped(event.target.value);
              onChange(readNumber(event.target.value));
            }}
            onBlur={() => {
              setTyped(null);
              onBlur?.();
            }}
          />
          {unit && (
            <span className="pointer-events-none absolute inset-y-0 right-3 grid place-items-center text-slate">
              {unit}
            </span>
          )}
        </div>
      )}
    </Field>
  );
}

/** The number a person typed with point or comma; null when empty, NaN when it is no number. */
export function readNumber(text: string): number | null {
  const clean = text.trim().replace(',', '.');
  if (clean === '') return null;
  return /^-?\d*\.?\d+\.?$/.test(clean) || /^-?\d+\.$/.test(clean) ? Number(clean) : Number.NaN;
}

function round(value: number, decimals: number): number {
  const factor = 10 ** decimals;
  return Math.round(value * factor) / factor;
}
