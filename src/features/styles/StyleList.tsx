import type { Style } from '#shared/api/styles.ts';
import { useRetireStyle } from '#src/api/styles.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { Chip } from '#src/components/Chip.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { toast } from '#src/components/toast.ts';
import { errorWords } from '#src/lib/errorWords.ts';
import { examplePet } from './examplePet.ts';
import { tryStyle } from './StyleMinutes.tsx';
import { writeSpan } from '#src/lib/words.ts';

interface Actions {
  mayEdit: boolean;
  onEdit: (style: Style) => void;
  onCopy: (style: Style) => void;
}

/** Own styles first, because they are the ones to work on; the starting library below. */
export function StyleList({ styles, ...actions }: { styles: readonly Style[] } & Actions) {
  const own = styles.filter(({ source }) => source === 'own');
  const starting = styles.filter(({ source }) => source === 'starting');
  return (
    <div className="grid max-w-5xl gap-4">
      {own.length === 0 ? (
        <EmptyState title="No style of your own yet">
          {actions.mayEdit
            ? 'Copy a starting style below and make it yours: pets that have it follow its changes.'
            : 'Nobody has copied a starting style yet.'}
        </EmptyState>
      ) : (
        <Card title="Your styles">
          <StyleRows styles={own} {...actions} />
        </Card>
      )}
      <Card title="Starting styles" dim="always there; copy one to change it">
        <StyleRows styles={starting} {...actions} />
      </Card>
    </div>
  );
}

function StyleRows({ styles, ...actions }: { styles: readonly Style[] } & Actions) {
  return (
    <ul className="rows">
      {styles.map((style) => (
        <li
          key={style.id}
          className={`flex flex-wrap items-center justify-between gap-x-4 gap-y-1.5 py-2.5 ${style.retired ? 'text-slate' : ''}`}
        >
          <div className="min-w-0">
            <p className="font-medium">
              {style.name} {style.retired && <Chip>retired</Chip>}
            </p>
            <p className="text-sm text-slate">
              {style.species} · {exampleWords(style)}
            </p>
          </div>
          {actions.mayEdit && <RowActions style={style} {...actions} />}
        </li>
      ))}
    </ul>
  );
}

function RowActions({ style, onEdit, onCopy }: { style: Style } & Actions) {
  const retire = useRetireStyle();
  const set = (retired: boolean) =>
    retire.mutate(
      { params: { styleId: style.id }, body: { retired } },
      {
        onSuccess: () =>
          toast(
            retired
              ? `${style.name} is not offered any more; pets that have it keep it.`
              : `${style.name} is offered again.`,
          ),
        onError: (error) => toast(errorWords(error), 'bad'),
      },
    );
  return (
    <div className="flex flex-wrap gap-2">
      {style.source === 'own' && (
        <>
          <Button size="small" onClick={() => onEdit(style)} aria-label={`Edit ${style.name}`}>
            Edit
          </Button>
          <Button
            size="small"
            kind="quiet"
            busy={retire.isPending}
            onClick={() => set(!style.retired)}
            aria-label={`${style.retired ? 'Offer again' : 'Retire'} ${style.name}`}
          >
            {style.retired ? 'Offer again' : 'Retire'}
          </Button>
        </>
      )}
      <Button size="small" onClick={() => onCopy(style)} aria-label={`Copy ${style.name}`}>
        Copy
      </Button>
    </div>
  );
}

/** "58 min on a labradoodle, 27 kg" */
function exampleWords(style: Style): string {
  const { facts, words } = examplePet(style);
  const forecast = tryStyle(facts, style);
  return typeof forecast === 'string' ? words : `${writeSpan(forecast.medianSeconds)} on ${words}`;
}
