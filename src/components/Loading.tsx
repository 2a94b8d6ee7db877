const widths = ['w-2/3', 'w-full', 'w-5/6', 'w-3/4', 'w-11/12', 'w-1/2'];

/** Lines in place of what is being fetched; `words` are read aloud. */
export function Loading({ lines = 4, words = 'Loading' }: { lines?: number; words?: string }) {
  return (
    <div role="status" className="animate-pulse space-y-3 py-2">
      <span className="sr-only">{words}</span>
      {Array.from({ length: lines }, (_, index) => (
        <div
          key={index}
          aria-hidden="true"
          className={`h-4 rounded-md bg-linen ${widths[index % widths.length]}`}
        />
      ))}
    </div>
  );
}
