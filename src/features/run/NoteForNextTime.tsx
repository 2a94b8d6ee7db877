import { TextArea } from '#src/components/TextArea.tsx';

/** Sent along with 'Done here' and shown at the next visit. */
export function NoteForNextTime({
  value,
  onChange,
}: {
  value: string;
  onChange: (note: string) => void;
}) {
  return (
    <details className="card mt-3 px-4" open={value !== '' || undefined}>
      <summary className="flex min-h-12 items-center font-medium">
        <span aria-hidden="true">▸&nbsp;</span>Note for next time
      </summary>
      <TextArea
        className="pb-3"
        label="What should be known next time"
        rows={2}
        maxLength={2000}
        value={value}
        onChange={(event) => onChange(event.target.value)}
      />
    </details>
  );
}
