import { Link, Outlet } from 'react-router-dom';
import { CombMark } from '#src/components/CombMark.tsx';
import { OfflineBanner } from '#src/components/OfflineBanner.tsx';
import { ToastRegion } from '#src/components/ToastRegion.tsx';

/** Around the screens before the sign-in. */
export function DoorShell() {
  return (
    <>
      <OfflineBanner />
      <main className="mx-auto w-full max-w-[30rem] px-4 pt-8 pb-16 md:pt-16">
        <Link
          to="/sign-in"
          className="mb-6 inline-flex min-h-11 items-center gap-2.5 text-xl font-bold tracking-tight text-ink no-underline"
        >
          <CombMark />
          Furlong
        </Link>
        <Outlet />
      </main>
      <ToastRegion />
    </>
  );
}
