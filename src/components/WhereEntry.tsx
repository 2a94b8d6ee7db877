import { useState, type ReactNode } from 'react';
import { Button } from './Button.tsx';
import { Combobox, type ComboOption } from './Combobox.tsx';

/** An address from a list, or a pin on a map that opens below. `map` is drawn only when asked for. */
export function WhereEntry({
  label,
  hint,
  error,
  text,
  onText,
  options,
  onPick,
  loading,
  emptyWords,
  said,
  spot,
  map,
}: {
  label: string;
  hint?: string;
  error?: string | undefined;
  text: string;
  onText: (text: string) => void;
  options: readonly ComboOption[];
  onPick: (option: ComboOption) => void;
  loading: boolean;
  emptyWords: string;
  /** What the last pin led to. */
  said: string | null;
  spot: { lat: number; lon: number } | null;
  map: () => ReactNode;
}) {
  const [open, setOpen] = useState(false);
  return (
    <div>
      <Combobox
        {...{ label, hint, error, text, onText, options, onPick, loading, emptyWords }}
        placeholder="Street and number"
      />
      <div className="mt-1.5 flex flex-wrap items-center gap-x-3 gap-y-1">
        <Button size="small" onClick={() => setOpen(!open)} aria-expanded={open}>
          {open ? 'Hide the map' : spot ? 'See or move the pin' : 'Drop a pin on the map'}
        </Button>
        <span className="text-sm text-slate" role="status">
          {said ?? (spot ? '✓ placed on the map' : 'not placed on the map yet')}
        </span>
      </div>
      {open && <div className="mt-3">{map()}</div>}
    </div>
  );
}
