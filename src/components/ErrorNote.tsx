import { errorWords } from '#src/lib/errorWords.ts';
import { Button } from './Button.tsx';

/** Something failed: the words of the error and, when it can be done again, how. */
export function ErrorNote({
  error,
  title,
  onRetry,
  retry = 'Try again',
  className = '',
}: {
  error: unknown;
  title?: string;
  onRetry?: (() => void) | undefined;
  retry?: string;
  className?: string;
}) {
  return (
    <div
      role="alert"
      className={`rounded-card border border-[#dfb3ad] bg-rosette-soft px-4 py-3 ${className}`}
    >
      {title && <p className="font-semibold text-rosette">{title}</p>}
      <p>
        <span aria-hidden="true" className="text-rosette">
          ▲{' '}
        </span>
        {errorWords(error)}
      </p>
      {onRetry && (
        <Button size="small" onClick={onRetry} className="mt-2.5">
          {retry}
        </Button>
      )}
    </div>
  );
}
