import type { PetStyle } from '#shared/api/petStyles.ts';
import { regionWords } from '#shared/grooming/regionWords.ts';
import type { Region } from '#shared/grooming/types.ts';
import { Card } from '#src/components/Card.tsx';
import { cutWords } from './cutWords.ts';
import { PhotoRow } from './PhotoRow.tsx';
import { finishChoices } from './serviceWords.ts';
import { sinceWords } from './sinceWords.ts';

/** Every version of a pet's style, newest first: what was its own, notes, photos. */
export function StyleVersions({
  petName,
  versions,
  timeZone,
  today,
  mayEdit,
}: {
  petName: string;
  versions: readonly PetStyle[];
  timeZone: string;
  today: string;
  mayEdit: boolean;
}) {
  return (
    <Card title="Versions and photos">
      <ol className="rows" aria-label="Versions of the style, newest first">
        {versions.map((version, index) => (
          <li key={version.version} className="py-3 first:pt-1">
            <p>
              <b className="font-semibold">Version {version.version}</b>{' '}
              <span className="text-slate">
                {[
                  sinceWords(version.madeAt, timeZone, today),
                  version.madeBy && `by ${version.madeBy}`,
                ]
                  .filter(Boolean)
                  .join(' · ')}
              </span>
            </p>
            <p className="text-slate">
              {[version.styleName, ownWords(version)].filter(Boolean).join(' · ')}
            </p>
            {version.notes && <p className="mt-1 whitespace-pre-line">{version.notes}</p>}
            <PhotoRow
              petName={petName}
              version={version}
              mayAdd={mayEdit && index === 0}
              mayRemove={mayEdit}
              timeZone={timeZone}
              today={today}
            />
          </li>
        ))}
      </ol>
    </Card>
  );
}

/** "own: back 4F · 19 mm, feet kept long" */
function ownWords({ ownCuts, ownFinish, ownServices, ownPlanB, style }: PetStyle): string {
  const cuts = Object.keys(ownCuts ?? {}).map((key) => {
    const region = key as Region;
    return `${regionWords([region])} ${cutWords(style.cuts, region).label}`;
  });
  const finish = finishChoices.find(({ value }) => value === ownFinish);
  const parts = [
    ...cuts,
    ...(finish ? [`${finish.label.toLowerCase()} finish`] : []),
    ...(ownServices ? ['services'] : []),
    ...(ownPlanB ? ['plan B'] : []),
  ];
  return parts.length > 0 ? `own: ${parts.join(', ')}` : 'as the style';
}
