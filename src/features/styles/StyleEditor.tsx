import { useReducer, useState, type ReactNode } from 'react';
import type { StyleShape } from '#shared/api/styles.ts';
import type { PetFacts, Region } from '#shared/grooming/types.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { CheckboxField } from '#src/components/CheckboxField.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { UnsavedGuard } from '#src/components/UnsavedGuard.tsx';
import { BodyDiagram } from './BodyDiagram.tsx';
import { CutEditor } from './CutEditor.tsx';
import { CutTable } from './CutTable.tsx';
import { DiagramLegend } from './DiagramLegend.tsx';
import { PlanBTable } from './PlanBTable.tsx';
import { serviceList, serviceWords } from './serviceWords.ts';
import { changeDraft, styleOf, type DraftChange, type StyleDraft } from './styleDraft.ts';
import { MinutesLine, StyleMinutes } from './StyleMinutes.tsx';

/**
 * A cut plan over the body, services and plan B, with the minutes beside them. `head` and `finish`
 * are what differs between a pet's version and a style of the library.
 */
export function StyleEditor({
  start,
  base,
  facts,
  petName,
  aboutPet,
  saveWords,
  dirtyAtStart = false,
  onSave,
  head,
  foot,
}: {
  start: StyleDraft;
  /** The style a draft comes from, for what may be left untouched; null: anything may. */
  base: (styleId: string) => StyleShape | null;
  facts: PetFacts | string;
  petName: string;
  /** Said under the minutes: whose they are. */
  aboutPet?: string;
  saveWords: string;
  dirtyAtStart?: boolean;
  onSave: (draft: StyleDraft) => Promise<void>;
  head: (draft: StyleDraft, change: (change: DraftChange) => void) => ReactNode;
  foot: (draft: StyleDraft, change: (change: DraftChange) => void) => ReactNode;
}) {
  const [draft, change] = useReducer(changeDraft, start);
  const [picked, setPicked] = useState<Region | null>(null);
  const [saving, setSaving] = useState(false);
  const [failure, setFailure] = useState<unknown>(null);
  const style = styleOf(draft);
  const [startStyle] = useState(() => styleOf(start));
  const from = base(draft.styleId);
  const save = async () => {
    setSaving(true);
    setFailure(null);
    try {
      await onSave({ ...draft, planB: style.planB });
    } catch (error) {
      setFailure(error);
    } finally {
      setSaving(false);
    }
  };
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] items-start gap-4 xl:grid-cols-[minmax(0,2.1fr)_minmax(0,1fr)] xl:gap-5">
      <div className="grid grid-cols-[minmax(0,1fr)] gap-4">
        {head(draft, change)}
        <Card title="Cut plan" dim="pick a region on the body or in the list">
          <div className="grid grid-cols-[minmax(0,1fr)] items-start gap-4 lg:grid-cols-[minmax(0,1.45fr)_minmax(0,1fr)]">
            <div className="lg:sticky lg:top-4">
              <BodyDiagram
                species={draft.species}
                cuts={draft.cuts}
                picked={picked}
                onPick={setPicked}
              />
              <DiagramLegend />
            </div>
            <CutTable
              cuts={draft.cuts}
              picked={picked}
              onPick={setPicked}
              editor={(region) => (
                <CutEditor
                  region={region}
                  cut={draft.cuts[region]}
                  mayBeUntouched={!from?.cuts[region]}
                  onChange={(cut) => change({ kind: 'cut', region, cut })}
                />
              )}
            />
          </div>
        </Card>
        <div className="grid items-start gap-4 lg:grid-cols-2">
          <Card title="Services">
            <fieldset>
              <legend className="sr-only">Services of this style</legend>
              {serviceList.map((service) => (
                <CheckboxField
                  key={service}
                  label={serviceWords[service]}
                  checked={draft.services.includes(service)}
                  onChange={({ target }) =>
                    change({ kind: 'service', service, wanted: target.checked })
                  }
                />
              ))}
            </fieldset>
          </Card>
          <Card title="Plan B" dim="when the pet has had enough">
            <PlanBTable
              style={style}
              onPick={(part, key, word) => change({ kind: 'planB', part, key, word })}
            />
          </Card>
        </div>
        {foot(draft, change)}
      </div>
      <StyleMinutes facts={facts} style={style} petName={petName}>
        {aboutPet && <p className="mt-2 text-sm text-slate">{aboutPet}</p>}
      </StyleMinutes>
      {failure ? (
        <ErrorNote error={failure} title="The style is not saved" className="xl:col-span-2" />
      ) : null}
      <div className="card sticky bottom-[4.25rem] z-20 flex items-center justify-between gap-x-4 px-4 py-2.5 md:bottom-3 md:px-5 xl:col-span-2">
        <MinutesLine facts={facts} style={style} before={startStyle} />
        <Button
          kind="go"
          busy={saving}
          busyWords="Saving"
          className="shrink-0"
          onClick={() => void save()}
        >
          {saveWords}
        </Button>
      </div>
      <UnsavedGuard when={(dirtyAtStart || draft !== start) && !saving} />
    </div>
  );
}
