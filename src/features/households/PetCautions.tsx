import type { Pet } from '#shared/api/pets.ts';
import { findCaution } from '#shared/grooming/cautions.ts';
import type { CautionKey } from '#shared/grooming/types.ts';
import { Card } from '#src/components/Card.tsx';
import { Chip } from '#src/components/Chip.tsx';

/** What was noted on the pet, whole, and the vet to call. What follows from facts is in the forecast. */
export function PetCautions({ pet }: { pet: Pet }) {
  const noted = pet.cautions.map((key) => ({ key, words: cautionWords(key) }));
  const none = noted.length === 0 && !pet.cautionNote;
  return (
    <Card title="Cautions" dim="shown wherever the pet is handled">
      {none && <p className="text-slate">None noted.</p>}
      <ul className="grid gap-1.5">
        {pet.cautionNote && (
          <li>
            <Chip tone="heed">{pet.cautionNote}</Chip>
          </li>
        )}
        {noted.map(({ key, words }) => (
          <li key={key}>
            <Chip tone="bad">{words}</Chip>
          </li>
        ))}
      </ul>
      {(pet.vetName || pet.vetPhone) && (
        <p className="mt-3 border-t border-linen pt-2.5">
          <span className="text-slate">Vet: </span>
          {pet.vetName || 'their own'}{' '}
          {pet.vetPhone && (
            <a className="text-link" href={`tel:${pet.vetPhone}`}>
              call {pet.vetPhone}
            </a>
          )}
        </p>
      )}
    </Card>
  );
}

function cautionWords(key: string): string {
  try {
    return findCaution(key as CautionKey).words;
  } catch {
    // Noted under an older table: its key still says something.
    return key;
  }
}
