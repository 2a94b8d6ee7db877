import { useState } from 'react';
import type { Pet } from '#shared/api/pets.ts';
import { useUpdatePet } from '#src/api/pets.ts';
import { Button } from '#src/components/Button.tsx';
import { ConfirmDialog } from '#src/components/ConfirmDialog.tsx';
import { toast } from '#src/components/toast.ts';
import { errorWords } from '#src/lib/errorWords.ts';

/** A pet that died or moved away is not booked any more; its past stays. Or back again. */
export function RestPet({ pet }: { pet: Pet }) {
  const update = useUpdatePet();
  const [asking, setAsking] = useState(false);
  const set = (active: boolean) =>
    update.mutate(
      { params: { petId: pet.id }, body: { active } },
      {
        onSuccess: () => {
          setAsking(false);
          toast(
            active ? `${pet.name} can be booked again.` : `${pet.name} is not booked any more.`,
          );
        },
        onError: (error) => toast(errorWords(error), 'bad'),
      },
    );
  if (!pet.active)
    return (
      <Button size="small" busy={update.isPending} onClick={() => set(true)}>
        Book {pet.name} again
      </Button>
    );
  return (
    <>
      <Button size="small" onClick={() => setAsking(true)}>
        Stop booking {pet.name}
      </Button>
      {asking && (
        <ConfirmDialog
          title={`Stop booking ${pet.name}?`}
          confirm="Stop booking"
          keep="Keep booking"
          busy={update.isPending}
          onConfirm={() => set(false)}
          onClose={() => setAsking(false)}
        >
          The pet leaves the lists and no visit can be booked for it. What was done stays, and it
          can come back.
        </ConfirmDialog>
      )}
    </>
  );
}
