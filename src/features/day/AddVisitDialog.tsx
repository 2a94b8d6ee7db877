import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { householdQueries } from '#src/api/households.ts';
import { ButtonLink } from '#src/components/ButtonLink.tsx';
import { Combobox } from '#src/components/Combobox.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { writeDate, writeList } from '#src/lib/words.ts';

/** Finds the household; pets, minutes and promise are then chosen on its own page, for this day. */
export function AddVisitDialog({ date, onClose }: { date: string; onClose: () => void }) {
  const [text, setText] = useState('');
  const navigate = useNavigate();
  const found = useQuery({
    ...householdQueries.list(text.trim(), 1),
    enabled: text.trim().length > 0,
  });
  const options = (text.trim() === '' ? [] : (found.data?.households ?? [])).map((household) => ({
    key: household.id,
    label: household.name,
    detail: writeList(household.pets.map((pet) => pet.name)) || household.addressLabel,
  }));
  return (
    <Dialog
      title={`Add a visit on ${writeDate(date)}`}
      onClose={onClose}
      actions={<ButtonLink to="/households/new">New household</ButtonLink>}
    >
      <div className="min-h-72">
        <Combobox
          label="Household"
          hint="Name, pet, street or phone"
          text={text}
          onText={setText}
          options={options}
          loading={found.isFetching}
          emptyWords="Nobody found. Try another word, or add a new household."
          onPick={(option) => void navigate(`/households/${option.key}?book=${date}`)}
        />
        {found.error && <ErrorNote error={found.error} className="mt-3" />}
      </div>
    </Dialog>
  );
}
