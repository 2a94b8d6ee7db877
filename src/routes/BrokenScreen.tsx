import { useEffect } from 'react';
import { isRouteErrorResponse, useRouteError } from 'react-router-dom';
import { Button } from '#src/components/Button.tsx';
import { CombMark } from '#src/components/CombMark.tsx';
import { buttonLook } from '#src/components/buttonLook.ts';
import { errorWords } from '#src/lib/errorWords.ts';

const reloadedKey = 'furlong.reloadedFor';

/** A screen that failed to load or to draw. A new release replaces chunks, so that one is reloaded once. */
export function BrokenScreen() {
  const error = useRouteError();
  const missing = isMissingChunk(error);
  useEffect(() => {
    if (!missing || !navigator.onLine) return;
    if (sessionStorage.getItem(reloadedKey) === location.href) return;
    sessionStorage.setItem(reloadedKey, location.href);
    location.reload();
  }, [missing]);
  return (
    <main className="mx-auto grid max-w-xl gap-4 px-5 py-16">
      <CombMark />
      <h1 className="text-[26px] leading-tight tracking-tight">
        {missing ? 'This screen could not be loaded' : 'This screen broke'}
      </h1>
      <p className="text-slate">
        {missing
          ? 'The network may be gone, or Furlong was updated meanwhile. Reload the page.'
          : 'Nothing you saved is lost. Reload the page; if it breaks again, go to the start.'}
      </p>
      <p className="rounded-card border border-fawn bg-linen px-4 py-3 text-sm">{wordsOf(error)}</p>
      <div className="flex flex-wrap gap-2.5">
        <Button kind="go" onClick={() => location.reload()}>
          Reload the page
        </Button>
        {/* A plain link: the router itself may be what broke. */}
        <a href="/" className={`${buttonLook()} no-underline`}>
          Go to the start
        </a>
      </div>
    </main>
  );
}

function isMissingChunk(error: unknown): boolean {
  return (
    error instanceof Error &&
    /dynamically imported module|importing a module script|module script failed/i.test(
      error.message,
    )
  );
}

function wordsOf(error: unknown): string {
  if (isRouteErrorResponse(error)) return `${error.status} ${error.statusText}`;
  return errorWords(error);
}
