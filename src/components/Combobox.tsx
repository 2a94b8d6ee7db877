import { useEffect, useRef, useState, type KeyboardEvent, type ReactNode } from 'react';
import { Field, type FieldAbout } from './Field.tsx';

export interface ComboOption {
  key: string;
  label: string;
  detail?: ReactNode;
}

/**
 * A text entry with a list of matches below it (the WAI-ARIA combobox with a list box). Arrows walk
 * the list, Enter picks, Escape closes it. The caller finds the matches for `text`.
 */
export function Combobox({
  label,
  hint,
  error,
  required,
  className,
  text,
  onText,
  options,
  onPick,
  loading = false,
  emptyWords,
  placeholder,
  onBlur,
}: FieldAbout & {
  text: string;
  onText: (text: string) => void;
  options: readonly ComboOption[];
  onPick: (option: ComboOption) => void;
  loading?: boolean;
  /** Shown when there is text and no match. */
  emptyWords: string;
  placeholder?: string;
  onBlur?: () => void;
}) {
  const [open, setOpen] = useState(false);
  const [active, setActive] = useState(-1);
  const list = useRef<HTMLUListElement>(null);
  useEffect(() => {
    list.current?.children[active]?.scrollIntoView({ block: 'nearest' });
  }, [active]);
  const pick = (option: ComboOption) => {
    onPick(option);
    setOpen(false);
    setActive(-1);
  };
  const press = (event: KeyboardEvent) => {
    if (event.key === 'ArrowDown' || event.key === 'ArrowUp') {
      event.preventDefault();
      setOpen(true);
      const step = event.key === 'ArrowDown' ? 1 : -1;
      if (options.length > 0)
        setActive(
          (at) => (at + step + options.length + (at < 0 && step < 0 ? 1 : 0)) % options.length,
        );
    } else if (event.key === 'Enter' && open && options[active]) {
      event.preventDefault();
      pick(options[active]);
    } else if (event.key === 'Escape' && open) {
      // Escape closes the list first; a dialog around it stays.
      event.preventDefault();
      event.stopPropagation();
      setOpen(false);
    }
  };
  const showList = open && (options.length > 0 || (text.trim().length > 1 && !loading));
  return (
    <Field {...{ label, hint, error, required, className }}>
      {(wiring) => (
        <div className="relative">
          <input
            {...wiring}
            type="text"
            role="combobox"
            autoComplete="off"
            aria-autocomplete="list"
            aria-expanded={showList}
            aria-controls={`${wiring.id}-list`}
            aria-activedescendant={
              showList && options[active] ? `${wiring.id}-option-${active}` : undefined
            }
            placeholder={placeholder}
            className="entry"
            value={text}
            onChange={(event) => {
              onText(event.target.value);
              setOpen(true);
              setActive(-1);
            }}
            onFocus={() => setOpen(true)}
            onBlur={() => {
              setOpen(false);
              onBlur?.();
            }}
            onKeyDown={press}
          />
          <ul
            ref={list}
            id={`${wiring.id}-list`}
            role="listbox"
            aria-label="Matches"
            hidden={!showList}
            className="absolute inset-x-0 top-full z-30 mt-1 max-h-72 overflow-y-auto rounded-[12px] border border-fawn bg-white p-1 shadow-lg"
          >
            {options.map((option, index) => (
              <li
                key={option.key}
                id={`${wiring.id}-option-${index}`}
                role="option"
                aria-selected={index === active}
                // Before the entry's blur, which closes the list.
                onPointerDown={(event) => event.preventDefault()}
                onClick={() => pick(option)}
                className="flex min-h-11 cursor-pointer items-center justify-between gap-3 rounded-lg px-3 py-1.5 hover:bg-linen aria-selected:bg-collar-soft md:min-h-9"
              >
                <span>{option.label}</span>
                {option.detail && <span className="text-sm text-slate">{option.detail}</span>}
              </li>
            ))}
            {options.length === 0 && <li className="px-3 py-2 text-slate">{emptyWords}</li>}
          </ul>
          <span className="sr-only" role="status">
            {showList ? (options.length > 0 ? `${options.length} matches` : emptyWords) : ''}
          </span>
        </div>
      )}
    </Field>
  );
}
