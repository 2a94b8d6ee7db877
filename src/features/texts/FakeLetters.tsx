import { useQuery } from '@tanstack/react-query';
import { textQueries } from '#src/api/texts.ts';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { FakeFrame } from './FakeFrame.tsx';
import { LinkedWords } from './LinkedWords.tsx';

/** Every letter the fake mailbox kept, newest first. */
export function FakeLetters() {
  const { data, error } = useQuery({ ...textQueries.fakeLetters(), refetchInterval: 3_000 });
  const letters = data?.toSorted((a, b) => b.at.localeCompare(a.at));
  return (
    <FakeFrame
      title="Fake letters"
      said="these e-mails stayed on this machine and went to nobody"
      error={error}
    >
      {!letters && <Loading words="Loading the fake letters" />}
      {letters?.length === 0 && (
        <EmptyState title="No letter yet">
          Invite somebody in Setup, or ask for a new password; the letter shows here.
        </EmptyState>
      )}
      <ul className="grid max-w-3xl gap-4">
        {letters?.map((letter) => (
          <li key={letter.id} className="card px-5 py-4">
            <h2 className="text-[17px] font-semibold">{letter.subject}</h2>
            <p className="mb-2.5 text-sm text-slate">
              to {letter.to} · {new Date(letter.at).toLocaleString('en-GB')}
            </p>
            <p className="whitespace-pre-line">
              <LinkedWords text={letter.text} />
            </p>
          </li>
        ))}
      </ul>
    </FakeFrame>
  );
}
