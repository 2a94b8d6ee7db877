import { useId } from 'react';
import type { Choice } from './SelectField.tsx';

/** One of two to five, all in sight. A radio group under the paint. */
export function Segmented<Value extends string>({
  label,
  choices,
  value,
  onChange,
  hint,
  disabled,
  className = '',
}: {
  label: string;
  choices: readonly (Choice & { value: Value })[];
  value: Value;
  onChange: (value: Value) => void;
  hint?: string;
  disabled?: boolean;
  className?: string;
}) {
  const name = useId();
  return (
    <fieldset className={className} disabled={disabled}>
      <legend className="mb-1 text-[15px] font-medium">{label}</legend>
      <div className="inline-flex max-w-full flex-wrap gap-1 rounded-[12px] border border-fawn bg-linen p-1">
        {choices.map((choice) => (
          <label
            key={choice.value}
            className="grid min-h-10 cursor-pointer place-items-center rounded-[9px] px-2.5 text-[15px] has-checked:bg-white has-checked:font-semibold has-checked:shadow-[0_0_0_1px_var(--collar)] has-focus-visible:outline-3 has-focus-visible:outline-collar md:min-h-8.5"
          >
            <input
              type="radio"
              className="sr-only"
              name={name}
              value={choice.value}
              checked={choice.value === value}
              onChange={() => onChange(choice.value)}
            />
            {choice.label}
          </label>
        ))}
      </div>
      {hint && <p className="mt-1 text-sm text-slate">{hint}</p>}
    </fieldset>
  );
}
