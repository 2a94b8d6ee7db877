import { lazy, Suspense, useEffect } from 'react';
import type { Arrival } from '#shared/api/arrival.ts';
import { buttonLook } from '#src/components/buttonLook.ts';
import { ShapeMark } from '#src/components/ShapeMark.tsx';
import { useOnline } from '#src/lib/useOnline.ts';
import { possessive } from './possessive.ts';
import { useArrival } from './useArrival.ts';
import { VisitStrip } from './VisitStrip.tsx';

const ArrivalMap = lazy(async () => ({
  default: (await import('./ArrivalMap.tsx')).ArrivalMap,
}));

/** What a pet owner opens from the text: when to open the door, then everything else. */
export function ArrivalPage({ token, given }: { token: string; given: Arrival | null }) {
  const { arrival, gone, silent, heardAtMs } = useArrival(token, given);
  const online = useOnline();
  useEffect(() => {
    if (arrival) document.title = `${arrival.headline} · ${arrival.businessName}`;
  }, [arrival]);
  if (gone) return <Gone />;
  if (!arrival) return <Opening silent={silent || !online} />;
  return (
    <div className="mx-auto flex min-h-dvh max-w-[480px] flex-col px-[18px] pt-[26px]">
      <main className="flex-1">
        <p className="mb-5 font-bold">{arrival.businessName}</p>
        <p className="text-[15px] text-slate">
          {possessive(arrival.petNames)} visit{isToday(arrival) && ' today'}
        </p>
        <div role="status">
          <h1 className="my-1 text-[34px] leading-[1.1] tracking-tight">{arrival.headline}</h1>
          <p className="mb-3.5">{arrival.sentence}</p>
        </div>
        {(silent || !online) && (
          <p className="mb-3.5 rounded-[10px] bg-[var(--honey-soft)] px-3.5 py-2.5">
            <span aria-hidden="true">◆ </span>No connection. This is how it stood at{' '}
            {clock(heardAtMs)}; it renews itself.
          </p>
        )}
        <div className="grid grid-cols-1 gap-3">
          {isAhead(arrival) && arrival.steps.length > 0 && (
            <section aria-label="What will be done" className="card px-4 pt-3 pb-2">
              <VisitStrip steps={arrival.steps} />
            </section>
          )}
          {arrival.van && (
            <Suspense fallback={<div className="h-[214px] animate-pulse rounded-card bg-linen" />}>
              <ArrivalMap arrival={arrival} van={arrival.van} />
            </Suspense>
          )}
          {isAhead(arrival) && arrival.haveReady.length > 0 && (
            <section className="card px-4 py-1">
              <h2 className="pt-2.5 text-base font-semibold">Please have ready</h2>
              <ul className="rows">
                {arrival.haveReady.map((line) => (
                  <li key={line} className="py-2.5 leading-snug">
                    {line}
                  </li>
                ))}
              </ul>
            </section>
          )}
        </div>
        <p className="mt-3 text-[15px] leading-snug text-slate">
          {arrival.promiseWords && `${arrival.promiseWords}. `}
          <ShapeMark shape={arrival.shape} /> {arrival.groomerName} works in van {arrival.vanName}.{' '}
          {vanWords(arrival)}
        </p>
      </main>
      <footer className="sticky bottom-0 bg-cream py-3 pb-[calc(12px+env(safe-area-inset-bottom))]">
        {arrival.callPhone && (
          <a
            href={`tel:${arrival.callPhone}`}
            className={`${buttonLook('plain', 'big')} no-underline`}
          >
            Call us
          </a>
        )}
      </footer>
    </div>
  );
}

function Gone() {
  return (
    <main className="mx-auto max-w-[480px] px-[18px] pt-16">
      <h1 className="text-[26px] leading-tight tracking-tight">This link has ended</h1>
      <p className="mt-2">
        It showed one visit and nothing else. For the next visit a new text brings a new link; if
        you expected a van today, answer the text or call the number you know.
      </p>
    </main>
  );
}

function Opening({ silent }: { silent: boolean }) {
  return (
    <main className="mx-auto max-w-[480px] px-[18px] pt-16" role="status">
      {silent ? (
        <>
          <h1 className="text-[26px] leading-tight tracking-tight">No connection</h1>
          <p className="mt-2">The visit shows here by itself as soon as the network is back.</p>
        </>
      ) : (
        <p>Looking up the visit.</p>
      )}
    </main>
  );
}

function isAhead({ state }: Arrival): boolean {
  return state === 'planned' || state === 'onTheWay';
}

/** Others' doors are nobody's business: the van shows only a few minutes after the last one. */
function vanWords({ state, van }: Arrival): string {
  if (state === 'onTheWay' && !van)
    return 'The van shows here on a map once it is a few minutes away from its last stop.';
  return state === 'planned' || state === 'onTheWay'
    ? 'The van is shown only while it is on its way to you.'
    : '';
}

/** A planned visit may be another day's; on the way and at work are today's. */
function isToday({ state }: Arrival): boolean {
  return state === 'onTheWay' || state === 'arrived';
}

function clock(ms: number): string {
  return new Intl.DateTimeFormat('en-GB', { hour: 'numeric', minute: '2-digit' }).format(ms);
}
