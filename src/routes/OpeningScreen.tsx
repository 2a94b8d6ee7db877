import { CombMark } from '#src/components/CombMark.tsx';

/** While the page finds out who is signed in. */
export function OpeningScreen() {
  return (
    <div role="status" className="grid min-h-dvh place-items-center">
      <div className="grid animate-pulse justify-items-center gap-3">
        <CombMark className="h-10 w-16" />
        <span className="text-slate">Opening Furlong</span>
      </div>
    </div>
  );
}
