import { Button } from '#src/components/Button.tsx';
import { TextField } from '#src/components/TextField.tsx';

/**
 * A code that is written and never read back here: undefined leaves it, null clears it, text sets it.
 */
export function GateCodeField({
  hasCode,
  value,
  onChange,
  error,
}: {
  hasCode: boolean;
  value: string | null | undefined;
  onChange: (value: string | null | undefined) => void;
  error?: string | undefined;
}) {
  if (value === null)
    return (
      <div>
        <p className="mb-1 text-[15px] font-medium">Gate code</p>
        <p className="mb-2 text-slate">The code is cleared when you save.</p>
        <Button size="small" onClick={() => onChange(undefined)}>
          Keep the code
        </Button>
      </div>
    );
  return (
    <div>
      <TextField
        label={hasCode ? 'New gate code' : 'Gate code'}
        required={false}
        autoComplete="off"
        hint={
          hasCode
            ? 'A code is kept. Leave this empty to keep it.'
            : 'Kept encrypted. Each time someone looks at it is logged.'
        }
        value={value ?? ''}
        onChange={(event) => onChange(event.target.value === '' ? undefined : event.target.value)}
        error={error}
      />
      {hasCode && value === undefined && (
        <Button size="small" kind="quiet" className="mt-1 -ml-3" onClick={() => onChange(null)}>
          Clear the code
        </Button>
      )}
    </div>
  );
}
