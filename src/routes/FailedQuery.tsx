import { ApiError } from '#src/api/ApiError.ts';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { PageHeader } from '#src/components/PageHeader.tsx';

/** A screen whose own facts did not come: the way back, and another try where one can help. */
export function FailedQuery({
  title,
  error,
  back,
  onRetry,
}: {
  title: string;
  error: unknown;
  back: { to: string; words: string };
  onRetry: () => void;
}) {
  const gone = error instanceof ApiError && error.code === 'notFound';
  return (
    <>
      <PageHeader title={title} back={back} />
      <ErrorNote error={error} onRetry={gone ? undefined : onRetry} className="max-w-3xl" />
    </>
  );
}
