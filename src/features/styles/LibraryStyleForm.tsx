import { useState } from 'react';
import type { Style } from '#shared/api/styles.ts';
import { useCreateStyle, useUpdateStyle } from '#src/api/styles.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { CheckboxField } from '#src/components/CheckboxField.tsx';
import { Segmented } from '#src/components/Segmented.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { toast } from '#src/components/toast.ts';
import { coatLabels } from './coatLabels.ts';
import { examplePet } from './examplePet.ts';
import { finishChoices } from './serviceWords.ts';
import { startDraft, type StyleDraft } from './styleDraft.ts';
import { StyleEditor } from './StyleEditor.tsx';

/** One style of the business's library in the same editor as a pet's, with an example pet's minutes. */
export function LibraryStyleForm({
  style,
  copy,
  onDone,
}: {
  style: Style;
  /** Make a new style of it instead of changing it. */
  copy: boolean;
  /** `saved` false: only looked, or thought better of it. */
  onDone: (saved: boolean) => void;
}) {
  const create = useCreateStyle();
  const update = useUpdateStyle();
  const [start] = useState(() => {
    const draft = startDraft(style, '');
    return copy ? { ...draft, name: `${style.name}, ours` } : draft;
  });
  const example = examplePet(style);
  const save = async ({ name, species, coats, cuts, finish, services, planB }: StyleDraft) => {
    if (name.trim() === '') throw new Error('Give the style a name.');
    const fields = { name, coats, cuts, finish, services, planB };
    if (copy) await create.mutateAsync({ body: { ...fields, species, basedOn: style.id } });
    else await update.mutateAsync({ params: { styleId: style.id }, body: fields });
    toast(`${name} is saved.`);
    onDone(true);
  };
  return (
    <>
      <div className="mb-3 flex flex-wrap items-center gap-3">
        <h2 className="text-xl">{copy ? `A copy of ${style.name}` : style.name}</h2>
        <Button size="small" kind="quiet" onClick={() => onDone(false)}>
          Back to the styles
        </Button>
      </div>
      <StyleEditor
        start={start}
        base={() => null}
        facts={example.facts}
        petName="the example"
        aboutPet={`On ${example.words}, calm, in good order, six weeks after the last groom.`}
        saveWords={copy ? 'Add this style' : 'Save this style'}
        onSave={save}
        head={(draft, change) => (
          <Card title="The style">
            <div className="grid gap-4 md:grid-cols-2">
              <TextField
                label="Name"
                value={draft.name}
                error={draft.name.trim() === '' ? 'must not be empty' : undefined}
                onChange={({ target }) =>
                  change({ kind: 'fields', fields: { name: target.value } })
                }
              />
              <Segmented
                label="Finish"
                choices={finishChoices}
                value={draft.finish}
                hint={finishChoices.find(({ value }) => value === draft.finish)?.hint ?? ''}
                onChange={(finish) => change({ kind: 'fields', fields: { finish } })}
              />
            </div>
          </Card>
        )}
        foot={(draft, change) => (
          <Card title="Coats it suits" dim="others may be asked for, and raise a caution">
            <fieldset className="grid gap-x-6 md:grid-cols-3">
              <legend className="sr-only">Coats it suits</legend>
              {coatLabels[draft.species].map(({ coat, label }) => (
                <CheckboxField
                  key={coat}
                  label={label}
                  checked={draft.coats.includes(coat)}
                  onChange={({ target }) =>
                    change({
                      kind: 'fields',
                      fields: {
                        coats: target.checked
                          ? [...draft.coats, coat]
                          : draft.coats.filter((one) => one !== coat),
                      },
                    })
                  }
                />
              ))}
            </fieldset>
          </Card>
        )}
      />
    </>
  );
}
