import { useOpenGate } from '#src/api/households.ts';
import { errorWords } from '#src/lib/errorWords.ts';
import { useState } from 'react';

/** Hidden until touched: each opening is logged, and nobody reads it over a shoulder. */
export function GateCode({ householdId }: { householdId: string }) {
  const open = useOpenGate();
  const [hidden, setHidden] = useState(false);
  const shown = open.data && !hidden ? open.data : null;
  const codes = shown
    ? [
        shown.siteGateCode && `gate ${shown.siteGateCode}`,
        shown.gateCode && `house ${shown.gateCode}`,
      ]
    : [];
  return (
    <div>
      <button
        type="button"
        className="inline-flex min-h-12 items-center gap-2 rounded-[10px] border border-[var(--edge)] bg-linen px-4 font-semibold"
        aria-live="polite"
        onClick={() => {
          if (shown) return setHidden(true);
          setHidden(false);
          if (!open.data) open.mutate({ params: { householdId } });
        }}
      >
        {shown ? (
          <>
            <span className="text-lg tracking-wider">
              {codes.filter(Boolean).join(' · ') || 'no code kept'}
            </span>
            <span className="font-normal text-slate">hide</span>
          </>
        ) : (
          <>
            gate <span aria-hidden="true">····</span>
            <span className="text-collar underline underline-offset-3">
              {open.isPending ? 'opening' : 'show'}
            </span>
          </>
        )}
      </button>
      {open.error && (
        <p role="alert" className="mt-1.5 text-[15px] text-rosette">
          ▲ {errorWords(open.error)} The desk can read it to you.
        </p>
      )}
      {shown && <p className="mt-1 text-sm text-slate">This opening was logged.</p>}
    </div>
  );
}
