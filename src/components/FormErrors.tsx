import { errorWords } from '#src/lib/errorWords.ts';

/** Above a form's button: why it was not saved, with what the server said about fields out of sight. */
export function FormErrors({
  error,
  fields = {},
}: {
  error: unknown;
  /** What no field on the screen shows, by path. */
  fields?: Record<string, string>;
}) {
  if (!error) return null;
  const lines = Object.entries(fields);
  return (
    <div role="alert" className="rounded-card border border-[#dfb3ad] bg-rosette-soft px-4 py-3">
      <p className="font-semibold">
        <span aria-hidden="true" className="text-rosette">
          ▲{' '}
        </span>
        {errorWords(error)}
      </p>
      {lines.length > 0 && (
        <ul className="mt-1 list-disc pl-6">
          {lines.map(([path, words]) => (
            <li key={path}>
              {path}: {words}
            </li>
          ))}
        </ul>
      )}
    </div>
  );
}
