import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { ApiError } from '#src/api/ApiError.ts';
import { CombMark } from '#src/components/CombMark.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { useTitle } from '#src/lib/useTitle.ts';

/** Around the fakes: hatched and said aloud, so that nobody takes them for the real thing. */
export function FakeFrame({
  title,
  said,
  error,
  children,
}: {
  title: string;
  said: string;
  error: Error | null;
  children: ReactNode;
}) {
  useTitle(title);
  const off = error instanceof ApiError && error.code === 'notFound';
  return (
    <>
      <header>
        <p
          className="px-4 py-2 text-center text-[15px] font-semibold text-ink"
          style={{
            background: 'repeating-linear-gradient(-45deg, #fbf0d6 0 14px, #f3dfae 14px 28px)',
          }}
        >
          Fake for development: {said}
        </p>
      </header>
      <main className="mx-auto max-w-[1440px] px-4 py-5 md:px-7">
        <div className="mb-4 flex flex-wrap items-center gap-x-5 gap-y-2">
          <CombMark />
          <h1 className="text-[26px] leading-tight tracking-tight">{title}</h1>
          <nav className="flex flex-wrap gap-x-4">
            <Link className="text-link inline-flex min-h-11 items-center" to="/fakes/phones">
              Phones
            </Link>
            <Link className="text-link inline-flex min-h-11 items-center" to="/fakes/letters">
              Letters
            </Link>
            <Link className="text-link inline-flex min-h-11 items-center" to="/">
              Back to Furlong
            </Link>
          </nav>
        </div>
        {off ? (
          <EmptyState title="The fakes are off">
            This server sends for real, or is not on this machine alone. There is nothing to see.
          </EmptyState>
        ) : (
          <>
            {error && <ErrorNote error={error} className="mb-4" />}
            {children}
          </>
        )}
      </main>
    </>
  );
}
