import { useId, useRef, type KeyboardEvent, type ReactNode } from 'react';

/** Tabs within a screen; arrow keys move between them. */
export function Tabs<Key extends string>({
  label,
  tabs,
  current,
  onChange,
  children,
}: {
  label: string;
  tabs: readonly { key: Key; words: ReactNode }[];
  current: Key;
  onChange: (key: Key) => void;
  children: ReactNode;
}) {
  const id = useId();
  const list = useRef<HTMLDivElement>(null);
  const move = (event: KeyboardEvent) => {
    const step = event.key === 'ArrowRight' ? 1 : event.key === 'ArrowLeft' ? -1 : 0;
    if (step === 0) return;
    event.preventDefault();
    const at = tabs.findIndex((tab) => tab.key === current);
    const next = (at + step + tabs.length) % tabs.length;
    onChange(tabs[next]!.key);
    list.current?.querySelectorAll<HTMLElement>('[role=tab]')[next]?.focus();
  };
  return (
    <div>
      <div
        ref={list}
        role="tablist"
        aria-label={label}
        tabIndex={-1}
        onKeyDown={move}
        className="flex gap-1 overflow-x-auto border-b border-fawn"
      >
        {tabs.map((tab) => (
          <button
            key={tab.key}
            type="button"
            role="tab"
            id={`${id}-${tab.key}`}
            aria-controls={`${id}-panel`}
            aria-selected={tab.key === current}
            tabIndex={tab.key === current ? 0 : -1}
            onClick={() => onChange(tab.key)}
            className={`-mb-px min-h-11 border-b-[3px] px-3.5 font-medium whitespace-nowrap ${
              tab.key === current
                ? 'border-collar text-ink'
                : 'border-transparent text-slate hover:text-ink'
            }`}
          >
            {tab.words}
          </button>
        ))}
      </div>
      <div role="tabpanel" id={`${id}-panel`} aria-labelledby={`${id}-${current}`}>
        {children}
      </div>
    </div>
  );
}
