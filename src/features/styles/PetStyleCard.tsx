import type { Pet } from '#shared/api/pets.ts';
import type { PetStyle } from '#shared/api/petStyles.ts';
import type { PetFacts } from '#shared/grooming/types.ts';
import { summaryWords } from '#shared/grooming/explain.ts';
import { ButtonLink } from '#src/components/ButtonLink.tsx';
import { Card } from '#src/components/Card.tsx';
import { ForecastNotes, ForecastSteps } from '#src/strips/ForecastSteps.tsx';
import { BodyDiagram } from './BodyDiagram.tsx';
import { CutTable } from './CutTable.tsx';
import { DiagramLegend } from './DiagramLegend.tsx';
import { finishChoices, serviceWords } from './serviceWords.ts';
import { stepLines } from './stepLines.ts';
import { tryStyle } from './StyleMinutes.tsx';
import { sinceWords } from './sinceWords.ts';

/** How the pet is groomed, on its body, beside what that takes. */
export function PetStyleCard({
  pet,
  version,
  facts,
  timeZone,
  today,
  editTo,
  learned,
}: {
  pet: Pet;
  /** The version that counts; null while it is being read. */
  version: PetStyle | null;
  facts: PetFacts | string;
  timeZone: string;
  today: string;
  /** Where the style is edited; null: look only. */
  editTo: string | null;
  /** What finished visits say, under the minutes. */
  learned: string | null;
}) {
  const { style } = pet;
  const forecast = tryStyle(facts, style);
  const since = version && sinceWords(version.madeAt, timeZone, today);
  return (
    <Card
      title={version ? `Style, version ${version.version}` : 'Style'}
      dim={since}
      aside={
        editTo && (
          <ButtonLink to={editTo} size="small">
            Edit the style
          </ButtonLink>
        )
      }
    >
      <p className="text-slate">
        {pet.styleName} · {finishWords(style.finish)} finish ·{' '}
        {style.services.length > 0
          ? style.services.map((service) => serviceWords[service]).join(', ')
          : 'no services'}
      </p>
      <div className="mt-3 grid grid-cols-[minmax(0,1fr)] items-start gap-x-7 gap-y-5 lg:grid-cols-[minmax(0,1.25fr)_minmax(0,1fr)]">
        <div>
          <BodyDiagram species={style.species} cuts={style.cuts} />
          <DiagramLegend />
          <div className="mt-3 sm:columns-2 sm:gap-x-8">
            <CutTable cuts={style.cuts} />
          </div>
          {pet.styleNotes && (
            <p className="mt-3 border-l-[3px] border-fawn pl-3 whitespace-pre-line">
              {pet.styleNotes}
            </p>
          )}
        </div>
        <div>
          <h3 className="mb-1 font-semibold">
            What it takes{' '}
            {typeof forecast !== 'string' && (
              <span className="font-medium text-slate">{summaryWords(forecast)}</span>
            )}
          </h3>
          {typeof forecast === 'string' ? (
            <p className="text-slate">{forecast}</p>
          ) : (
            <>
              <ForecastSteps steps={stepLines(forecast, style.cuts)} petName={pet.name} />
              {learned && <p className="mt-2 text-sm text-slate">{learned}</p>}
              <ForecastNotes forecast={forecast} />
            </>
          )}
        </div>
      </div>
    </Card>
  );
}

function finishWords(finish: string): string {
  return (finishChoices.find(({ value }) => value === finish)?.label ?? finish).toLowerCase();
}
