import { Suspense, useEffect, useRef } from 'react';
import {
  Link,
  Navigate,
  NavLink,
  Outlet,
  ScrollRestoration,
  useLocation,
  useNavigation,
} from 'react-router-dom';
import { useMaybeSession } from '#src/api/sessionStore.ts';
import { CombMark } from '#src/components/CombMark.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { OfflineBanner } from '#src/components/OfflineBanner.tsx';
import { ToastRegion } from '#src/components/ToastRegion.tsx';
import { AccountMenu } from './AccountMenu.tsx';
import { navIcons } from './navIcons.tsx';
import { mayOpen, navItems } from './navItems.ts';
import { NotAllowedScreen } from './NotAllowedScreen.tsx';

/** Around every screen behind the sign-in: brand, navigation by abilities, account, messages. */
export function AppShell() {
  const session = useMaybeSession();
  const location = useLocation();
  const moving = useNavigation().state !== 'idle';
  const firstPath = useRef(location.pathname);
  useEffect(() => {
    if (firstPath.current === location.pathname) return;
    firstPath.current = '';
    // Where the pressed link left with its screen, the keyboard goes on in the new one.
    if (document.activeElement === document.body)
      document.getElementById('main')?.focus({ preventScroll: true });
  }, [location.pathname]);
  if (!session) {
    const place = location.pathname + location.search;
    return (
      <Navigate
        to={place === '/' ? '/sign-in' : `/sign-in?to=${encodeURIComponent(place)}`}
        replace
      />
    );
  }
  const items = navItems(session.abilities, session.groomerId !== null);
  return (
    <div key={session.business.id} className="flex min-h-dvh flex-col">
      <a
        href="#main"
        className="sr-only rounded-b-card bg-collar px-4 py-3 font-semibold text-white focus:not-sr-only focus:absolute focus:z-50"
      >
        Skip to the screen
      </a>
      <OfflineBanner />
      {moving && (
        <div className="fixed inset-x-0 top-0 z-40 h-1 animate-pulse bg-apricot" role="status">
          <span className="sr-only">Loading the screen</span>
        </div>
      )}
      <header className="border-b border-fawn">
        <div className="mx-auto flex min-h-14 max-w-[1440px] items-center gap-6 px-4 md:min-h-15 md:px-7">
          <Link
            to="/"
            className="inline-flex min-h-11 items-center gap-2.5 text-xl font-bold tracking-tight text-ink no-underline"
          >
            <CombMark />
            Furlong
          </Link>
          <nav aria-label="Main" className="hidden gap-1 md:flex">
            {items.map((item) => (
              <NavLink
                key={item.to}
                to={item.to}
                className={({ isActive }) =>
                  `grid min-h-9.5 place-items-center rounded-[10px] px-3 font-medium no-underline ${
                    isActive ? 'bg-linen font-semibold text-ink' : 'text-slate hover:text-ink'
                  }`
                }
              >
                {item.words}
              </NavLink>
            ))}
          </nav>
          <div className="ml-auto">
            <AccountMenu session={session} />
          </div>
        </div>
      </header>
      <main
        id="main"
        tabIndex={-1}
        className="mx-auto w-full max-w-[1440px] flex-1 px-4 focus-visible:outline-none pt-4 pb-24 md:px-7 md:pt-6 md:pb-12"
      >
        <Suspense fallback={<Loading />}>
          {mayOpen(location.pathname, session.abilities) ? <Outlet /> : <NotAllowedScreen />}
        </Suspense>
      </main>
      {items.length > 1 && (
        <nav
          aria-label="Main"
          className="fixed inset-x-0 bottom-0 z-30 border-t border-fawn bg-cream pb-[env(safe-area-inset-bottom)] md:hidden"
        >
          {/* By the length of their words: seven of them fit a phone only so. */}
          <ul className="flex">
            {items.map((item) => (
              <li key={item.to} className="min-w-11 flex-auto">
                <NavLink
                  to={item.to}
                  className={({ isActive }) =>
                    `grid min-h-14 content-center justify-items-center gap-0.5 text-[11.5px] no-underline max-[359px]:text-[9.5px] ${
                      isActive
                        ? 'font-semibold text-collar shadow-[inset_0_3px_0_var(--collar)]'
                        : 'text-slate'
                    }`
                  }
                >
                  {navIcons[item.icon]}
                  {item.words}
                </NavLink>
              </li>
            ))}
          </ul>
        </nav>
      )}
      <ToastRegion high={location.pathname.startsWith('/run/')} />
      <ScrollRestoration />
    </div>
  );
}
