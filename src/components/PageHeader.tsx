import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { useTitle } from '#src/lib/useTitle.ts';

/** The title line of a screen. `title` also names the browser's tab. */
export function PageHeader({
  title,
  dim,
  back,
  actions,
}: {
  title: string;
  dim?: ReactNode;
  back?: { to: string; words: string };
  actions?: ReactNode;
}) {
  useTitle(title);
  return (
    <header className="mb-4 md:mb-5">
      {back && (
        <Link
          to={back.to}
          className="-mt-1 mb-1 inline-flex min-h-11 items-center text-[15px] font-medium text-slate no-underline hover:text-ink md:min-h-8"
        >
          <span aria-hidden="true">‹&nbsp;</span>
          {back.words}
        </Link>
      )}
      <div className="flex flex-wrap items-start justify-between gap-x-6 gap-y-3">
        <div>
          <h1 className="text-[26px] leading-[1.12] tracking-tight">{title}</h1>
          {dim && <div className="mt-1 text-slate">{dim}</div>}
        </div>
        {actions && <div className="flex flex-wrap gap-2">{actions}</div>}
      </div>
    </header>
  );
}
