import type { ReactNode } from 'react';

/** What is missing and what to do about it. */
export function EmptyState({
  title,
  children,
  action,
}: {
  title: string;
  children?: ReactNode;
  action?: ReactNode;
}) {
  return (
    <div className="rounded-card border border-dashed border-[var(--edge)] px-5 py-8 text-center">
      <p className="font-semibold">{title}</p>
      {children && <div className="mx-auto mt-1 max-w-prose text-slate">{children}</div>}
      {action && <div className="mt-4 flex flex-wrap justify-center gap-2.5">{action}</div>}
    </div>
  );
}
