import type { ReactNode } from 'react';

/** A white panel. `title` becomes its heading, `aside` stands to the right of it. */
export function Card({
  title,
  dim,
  aside,
  children,
  className = '',
}: {
  title?: ReactNode;
  /** Said behind the title in second text. */
  dim?: ReactNode;
  aside?: ReactNode;
  children: ReactNode;
  className?: string;
}) {
  return (
    <section className={`card px-4 py-4 md:px-5 ${className}`}>
      {(title || aside) && (
        <div className="mb-2 flex flex-wrap items-baseline justify-between gap-x-4 gap-y-1">
          <h2 className="text-base font-semibold">
            {title} {dim && <span className="font-medium text-slate">{dim}</span>}
          </h2>
          {aside}
        </div>
      )}
      {children}
    </section>
  );
}
