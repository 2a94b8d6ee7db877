import { useEffect, useRef, type ReactNode } from 'react';
import { regionWords } from '#shared/grooming/regionWords.ts';
import type { Region, Style } from '#shared/grooming/types.ts';
import { Button } from '#src/components/Button.tsx';
import { regionOrder } from './bodyShapes.ts';
import { cutWords } from './cutWords.ts';

/**
 * The cut plan in words, numbered as a small drawing is. With `onPick` a row opens and `editor`
 * stands in it; focus goes there, and back to the row's button when it is closed.
 */
export function CutTable({
  cuts,
  picked = null,
  onPick,
  editor,
}: {
  cuts: Style['cuts'];
  picked?: Region | null;
  onPick?: (region: Region | null) => void;
  editor?: (region: Region) => ReactNode;
}) {
  // To look at, what is left alone is one line; to edit, every region has its row.
  const rows = regionOrder.filter((region) => onPick || cuts[region]);
  const untouched = regionOrder.filter((region) => !rows.includes(region));
  return (
    <ol className="rows" aria-label="Cut plan by region">
      {rows.map((region) => (
        <CutRow
          key={region}
          number={regionOrder.indexOf(region) + 1}
          region={region}
          cuts={cuts}
          open={picked === region}
          {...(onPick && { onPick })}
        >
          {editor?.(region)}
        </CutRow>
      ))}
      {untouched.length > 0 && (
        <li className="break-inside-avoid py-1.5 text-slate">
          Not touched:{' '}
          {untouched
            .map((region) => `${regionOrder.indexOf(region) + 1} ${regionWords([region])}`)
            .join(', ')}
        </li>
      )}
    </ol>
  );
}

function CutRow({
  number,
  region,
  cuts,
  open,
  onPick,
  children,
}: {
  number: number;
  region: Region;
  cuts: Style['cuts'];
  open: boolean;
  onPick?: (region: Region | null) => void;
  children: ReactNode;
}) {
  const words = cutWords(cuts, region);
  const button = useRef<HTMLButtonElement>(null);
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (!open) return;
    const first = box.current?.querySelector<HTMLElement>('input:checked, input, select');
    first?.focus({ preventScroll: true });
    box.current?.scrollIntoView?.({ block: 'nearest' });
  }, [open]);
  const close = () => {
    onPick?.(null);
    button.current?.focus();
  };
  const line = (
    <>
      <span className="w-6 shrink-0 text-slate" aria-hidden="true">
        {number}
      </span>
      <span className="grow font-medium">
        {words.region}
        <span className="block text-sm font-normal text-slate">
          {[words.tool, words.direction].filter(Boolean).join(', ')}
        </span>
      </span>
      <span className="shrink-0 text-right">{words.left}</span>
    </>
  );
  if (!onPick)
    return <li className="flex break-inside-avoid items-baseline gap-1 py-1.5">{line}</li>;
  return (
    <li
      className={open ? 'rounded-[10px] bg-[var(--cream)] shadow-[0_0_0_1.5px_var(--rosette)]' : ''}
    >
      <button
        ref={button}
        type="button"
        aria-expanded={open}
        onClick={() => onPick(open ? null : region)}
        className="flex min-h-11 w-full items-baseline gap-1 rounded-[10px] px-2 py-1.5 text-left hover:bg-linen"
      >
        {line}
        <span className="w-5 shrink-0 text-right text-collar" aria-hidden="true">
          {open ? '▴' : '▾'}
        </span>
      </button>
      {open && (
        <div
          ref={box}
          role="group"
          aria-label={`Cut of the ${words.region}`}
          className="scroll-mt-4 scroll-mb-48 px-3 pt-1 pb-4"
          onKeyDown={(event) => {
            if (event.key !== 'Escape') return;
            event.stopPropagation();
            close();
          }}
        >
          {children}
          <Button size="small" onClick={close} className="mt-3">
            Done with the {words.region}
          </Button>
        </div>
      )}
    </li>
  );
}
