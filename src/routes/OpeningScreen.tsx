import { CombMark } from '#src/components/CombMark.tsx';

/** While the page finds out who is signed in. */
export function OpeningScreen() {
  return (
    <main className="grid min-h-dvh place-items-center">
      <div role="status" className="grid justify-items-center gap-3">
        <CombMark className="h-10 w-16 animate-pulse" />
        <h1 className="text-base font-normal">Opening Furlong</h1>
      </div>
    </main>
  );
}
