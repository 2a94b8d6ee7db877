import { useState } from 'react';
import type { Pet } from '#shared/api/pets.ts';
import type { Style } from '#shared/api/styles.ts';
import type { FinishLevel, PetFacts } from '#shared/grooming/types.ts';
import { useAddPetStyle } from '#src/api/petStyles.ts';
import { Card } from '#src/components/Card.tsx';
import { Segmented } from '#src/components/Segmented.tsx';
import { SelectField } from '#src/components/SelectField.tsx';
import { TextArea } from '#src/components/TextArea.tsx';
import { toast } from '#src/components/toast.ts';
import { finishChoices } from './serviceWords.ts';
import { offeredStyles, ownParts, startDraft, type StyleDraft } from './styleDraft.ts';
import { StyleEditor } from './StyleEditor.tsx';

/** The next version of a pet's style, begun from the one it has. */
export function PetStyleForm({
  pet,
  library,
  facts,
  version,
  onSaved,
}: {
  pet: Pet;
  library: readonly Style[];
  facts: PetFacts | string;
  /** The version that counts now. */
  version: number;
  onSaved: () => void;
}) {
  const add = useAddPetStyle();
  // A draft carries the base style's name: the pet's own changes do not rename it.
  const [start] = useState(() => startDraft({ ...pet.style, id: pet.styleId }, pet.styleNotes));
  const offered = offeredStyles(library, pet.species, pet.styleId);
  const base = (styleId: string) => library.find(({ id }) => id === styleId) ?? null;
  const save = async (draft: StyleDraft) => {
    const { styleId, notes } = draft;
    const from = base(styleId) ?? pet.style;
    await add.mutateAsync({
      params: { petId: pet.id },
      body: { styleId, notes, ...ownParts(draft, from) },
    });
    toast(`Version ${version + 1} of ${pet.name}’s style is saved.`);
    onSaved();
  };
  return (
    <StyleEditor
      start={start}
      base={base}
      facts={facts}
      petName={pet.name}
      saveWords={`Save as version ${version + 1}`}
      aboutPet="Forecasts from now on use it; visits already booked keep their minutes."
      onSave={save}
      head={(draft, change) => (
        <Card title="Starts from">
          <SelectField
            label="Style"
            choices={offered.map(({ id, name, source }) => ({
              value: id,
              label: source === 'own' ? `${name} · yours` : name,
            }))}
            value={draft.styleId}
            hint="Choosing another replaces the finish and the cut plan below."
            onChange={({ target }) => {
              const style = base(target.value);
              if (style) change({ kind: 'start', style });
            }}
          />
          <Segmented
            className="mt-3"
            label="Finish"
            choices={finishChoices}
            value={draft.finish}
            hint={finishHint(draft.finish, base(draft.styleId)?.finish)}
            onChange={(finish) => change({ kind: 'fields', fields: { finish } })}
          />
        </Card>
      )}
      foot={(draft, change) => (
        <Card title="Notes for this pet">
          <TextArea
            label="Style notes"
            required={false}
            rows={3}
            hint="“Ears long, feet round, no perfume.”"
            value={draft.notes}
            onChange={({ target }) => change({ kind: 'fields', fields: { notes: target.value } })}
          />
        </Card>
      )}
    />
  );
}

/** What the finish means, and the style's own when the pet has another. */
function finishHint(finish: FinishLevel, ofStyle: FinishLevel | undefined): string {
  const choice = (level: FinishLevel) => finishChoices.find(({ value }) => value === level)!;
  const { hint } = choice(finish);
  if (ofStyle === undefined || ofStyle === finish) return hint;
  return `${hint} The style has ${choice(ofStyle).label.toLowerCase()}.`;
}
