import { useEffect, useState } from 'react';
import { isRouteErrorResponse, useRouteError } from 'react-router-dom';
import { Button } from '#src/components/Button.tsx';
import { CombMark } from '#src/components/CombMark.tsx';
import { buttonLook } from '#src/components/buttonLook.ts';
import { errorWords } from '#src/lib/errorWords.ts';

const reloadedKey = 'furlong.reloadedFor';
const RETRY_MS = 5_000;

/** A screen that failed to load or to draw. A new release replaces chunks, so that one is reloaded once. */
export function BrokenScreen() {
  const error = useRouteError();
  const missing = isMissingChunk(error);
  const [silent, setSilent] = useState(false);
  const reload = async () => {
    // Reloading while nothing answers would trade this page for the browser's own.
    if (!missing || (await serverAnswers())) location.reload();
    else setSilent(true);
  };
  useEffect(() => {
    if (!missing || sessionStorage.getItem(reloadedKey) === location.href) return;
    const retry = async () => {
      if (!(await serverAnswers())) return;
      sessionStorage.setItem(reloadedKey, location.href);
      location.reload();
    };
    void retry();
    const timer = setInterval(() => void retry(), RETRY_MS);
    return () => clearInterval(timer);
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
      {!missing && (
        <p className="rounded-card border border-fawn bg-linen px-4 py-3 text-sm">
          {wordsOf(error)}
        </p>
      )}
      {silent && missing && (
        <p role="alert" className="font-semibold">
          <span aria-hidden="true">▲ </span>Furlong does not answer yet. This page tries again by
          itself.
        </p>
      )}
      <div className="flex flex-wrap gap-2.5">
        <Button kind="go" onClick={() => void reload()}>
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

async function serverAnswers(): Promise<boolean> {
  try {
    return (await fetch('/', { method: 'HEAD', cache: 'no-store' })).ok;
  } catch {
    return false;
  }
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
