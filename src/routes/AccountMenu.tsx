import { useEffect, useRef, useState } from 'react';
import { Link, useLocation, useNavigate } from 'react-router-dom';
import type { Session } from '#shared/api/session.ts';
import { useSignOut, useSwitchBusiness } from '#src/api/session.ts';
import { countUnsent } from '#src/offline/countUnsent.ts';
import { forgetRuns } from '#src/offline/forgetRuns.ts';
import { toast } from '#src/components/toast.ts';
import { errorWords } from '#src/lib/errorWords.ts';

/** Whose page this is: the business, a way to another one, and the way out. */
export function AccountMenu({ session }: { session: Session }) {
  const box = useRef<HTMLDetailsElement>(null);
  const location = useLocation();
  const navigate = useNavigate();
  const signOut = useSignOut();
  const [askedOnce, setAskedOnce] = useState(false);
  const switchBusiness = useSwitchBusiness();
  useEffect(() => {
    if (box.current) box.current.open = false;
  }, [location.pathname]);
  useEffect(() => {
    const close = (event: Event) => {
      const details = box.current;
      if (!details?.open) return;
      if (event instanceof KeyboardEvent) {
        if (event.key !== 'Escape') return;
        details.querySelector('summary')?.focus();
      } else if (details.contains(event.target as Node)) return;
      details.open = false;
    };
    document.addEventListener('pointerdown', close);
    document.addEventListener('keydown', close);
    return () => {
      document.removeEventListener('pointerdown', close);
      document.removeEventListener('keydown', close);
    };
  }, []);
  const goTo = (businessId: string) =>
    switchBusiness.mutate(
      { body: { businessId } },
      {
        onSuccess: () => navigate('/'),
        onError: (error) => toast(errorWords(error), 'bad'),
      },
    );
  const leave = async () => {
    if ((await countUnsent().catch(() => 0)) > 0 && !askedOnce) {
      setAskedOnce(true);
      return;
    }
    await forgetRuns().catch(() => undefined);
    // Signed out here even when the server could not be told.
    await signOut.mutateAsync().catch(() => undefined);
    navigate('/sign-in', { replace: true });
  };
  const row =
    'flex min-h-11 w-full items-center rounded-lg px-3 text-left text-ink no-underline hover:bg-linen';
  return (
    <details ref={box} className="relative">
      <summary className="flex min-h-11 max-w-[46vw] list-none items-center gap-2 rounded-full border border-fawn bg-white px-4 text-[15px] font-medium md:min-h-9.5 [&::-webkit-details-marker]:hidden">
        <span className="truncate">{session.business.name}</span>
        <svg viewBox="0 0 12 8" className="w-3 shrink-0" aria-hidden="true">
          <path d="M1 1.5 6 6.5 11 1.5" fill="none" stroke="currentColor" strokeWidth="2" />
        </svg>
      </summary>
      <div className="card absolute right-0 z-40 mt-2 w-72 p-2">
        <p className="px-3 pt-2 pb-2.5 leading-snug">
          <span className="block font-semibold">{session.user.name}</span>
          <span className="block text-sm break-words text-slate">
            {session.user.email} · {session.roles.join(', ')}
          </span>
        </p>
        {session.otherBusinesses.length > 0 && (
          <div className="border-t border-linen py-1">
            {session.otherBusinesses.map((business) => (
              <button
                key={business.id}
                type="button"
                className={row}
                disabled={switchBusiness.isPending}
                onClick={() => goTo(business.id)}
              >
                Work in {business.name}
              </button>
            ))}
          </div>
        )}
        {session.fakesActive && (
          <div className="border-t border-linen py-1">
            <Link className={row} to="/fakes/phones">
              Look at the fake phones
            </Link>
            <Link className={row} to="/fakes/letters">
              Look at the fake letters
            </Link>
          </div>
        )}
        <div className="border-t border-linen pt-1">
          {askedOnce && (
            <p role="alert" className="px-3 py-2 text-sm">
              Some taps of the run have not reached the desk yet. They stay on this phone and go out
              when you sign in again.
            </p>
          )}
          <button type="button" className={row} disabled={signOut.isPending} onClick={leave}>
            {askedOnce ? 'Sign out and leave them unsent' : 'Sign out'}
          </button>
        </div>
      </div>
    </details>
  );
}
