import { useEffect } from 'react';
import { useOpenGate } from '#src/api/households.ts';
import { Button } from '#src/components/Button.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';

/** The code behind a button; each look is logged, and after a minute it is hidden again. */
export function GateCode({ householdId }: { householdId: string }) {
  const open = useOpenGate();
  const { reset, data } = open;
  useEffect(() => {
    if (!data) return;
    const timer = setTimeout(reset, 60_000);
    return () => clearTimeout(timer);
  }, [data, reset]);
  if (open.isError) return <ErrorNote error={open.error} onRetry={() => reset()} />;
  return (
    <div className="flex flex-wrap items-center gap-3" aria-live="polite">
      {data ? (
        <>
          <span>
            {data.gateCode && (
              <>
                gate <b className="text-lg tracking-wider">{data.gateCode}</b>
              </>
            )}
            {data.gateCode && data.siteGateCode && ' · '}
            {data.siteGateCode && (
              <>
                site <b className="text-lg tracking-wider">{data.siteGateCode}</b>
              </>
            )}
            {!data.gateCode && !data.siteGateCode && 'No code is kept.'}
          </span>
          <Button size="small" onClick={() => reset()}>
            Hide it
          </Button>
        </>
      ) : (
        <>
          <span>
            gate <span aria-hidden="true">····</span>
          </span>
          <Button
            size="small"
            busy={open.isPending}
            onClick={() => open.mutate({ params: { householdId } })}
          >
            Show the gate code
          </Button>
          <span className="text-sm text-slate">Looking is logged.</span>
        </>
      )}
    </div>
  );
}
