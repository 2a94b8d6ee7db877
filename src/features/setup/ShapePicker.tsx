import { useId } from 'react';
import { vanShape, type Van } from '#shared/api/vans.ts';
import { ShapeMark } from '#src/components/ShapeMark.tsx';

/** The mark that tells a van apart on strips and map; a taken one may still be chosen. */
export function ShapePicker({
  value,
  taken,
  onChange,
}: {
  value: Van['shape'];
  taken: readonly Van['shape'][];
  onChange: (shape: Van['shape']) => void;
}) {
  const name = useId();
  return (
    <fieldset>
      <legend className="mb-1 text-[15px] font-medium">Mark on strips and map</legend>
      <div className="flex flex-wrap gap-2">
        {vanShape.options.map((shape) => (
          <label
            key={shape}
            className="grid min-h-12 w-[88px] cursor-pointer place-items-center rounded-[10px] border border-fawn bg-white py-1.5 text-center text-[13px] has-checked:border-collar has-checked:bg-collar-soft has-checked:font-semibold has-focus-visible:outline-3 has-focus-visible:outline-collar"
          >
            <input
              type="radio"
              className="sr-only"
              name={name}
              checked={shape === value}
              onChange={() => onChange(shape)}
            />
            <ShapeMark shape={shape} className="text-lg" />
            <span>
              {shape}
              {taken.includes(shape) && <span className="block text-slate">taken</span>}
            </span>
          </label>
        ))}
      </div>
    </fieldset>
  );
}
