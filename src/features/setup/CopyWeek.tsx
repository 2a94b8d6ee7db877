import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { Shift } from '#shared/api/groomers.ts';
import { addDays } from '#shared/time/localDate.ts';
import { groomerQueries, useSetShift } from '#src/api/groomers.ts';
import { Button } from '#src/components/Button.tsx';
import { toast } from '#src/components/toast.ts';
import { errorWords } from '#src/lib/errorWords.ts';
import { writeCount } from '#src/lib/words.ts';
import { shiftsToCopy } from './shiftsToCopy.ts';

/** Copies the week before into what is still free of this one; nothing set is overwritten. */
export function CopyWeek({ monday, present }: { monday: string; present: readonly Shift[] }) {
  const before = useQuery(groomerQueries.shifts(addDays(monday, -7), addDays(monday, -1)));
  const setShift = useSetShift();
  const [running, setRunning] = useState(false);
  const wanted = shiftsToCopy(before.data ?? [], present);
  const copy = async () => {
    setRunning(true);
    let copied = 0;
    try {
      for (const body of wanted) {
        await setShift.mutateAsync({ body });
        copied += 1;
      }
      toast(`${writeCount(copied, 'shift')} copied from the week before.`);
    } catch (error) {
      toast(`${copied} of ${wanted.length} copied. ${errorWords(error)}`, 'bad');
    } finally {
      setRunning(false);
    }
  };
  return (
    <Button
      size="small"
      disabled={wanted.length === 0 && !running}
      busy={running}
      busyWords="Copying"
      onClick={copy}
    >
      {wanted.length === 0
        ? 'Nothing to copy from the week before'
        : `Copy ${writeCount(wanted.length, 'shift')} from the week before`}
    </Button>
  );
}
