import { Button } from '#src/components/Button.tsx';

/** What can be done with the whole day. */
export function DayActions(props: {
  undo: { words: string } | null;
  redo: { words: string } | null;
  busy: boolean;
  canMove: boolean;
  canSend: boolean;
  canBook: boolean;
  looking: boolean;
  onUndo: () => void;
  onRedo: () => void;
  onFind: () => void;
  onSend: () => void;
  onAdd: () => void;
}) {
  return (
    <div className="flex flex-wrap gap-2">
      {props.canBook && <Button onClick={props.onAdd}>Add a visit</Button>}
      {props.canMove && (
        <>
          <Button
            onClick={props.onUndo}
            disabled={!props.undo || props.busy}
            title={props.undo ? `Take back: ${props.undo.words}` : 'Nothing to take back'}
          >
            Undo
          </Button>
          {props.redo && (
            <Button
              onClick={props.onRedo}
              disabled={props.busy}
              title={`Make again: ${props.redo.words}`}
            >
              Redo
            </Button>
          )}
          <Button onClick={props.onFind} disabled={props.busy || props.looking}>
            Find a better day
          </Button>
        </>
      )}
      {props.canSend && (
        <Button kind="go" onClick={props.onSend} disabled={props.busy}>
          Send to vans
        </Button>
      )}
    </div>
  );
}
