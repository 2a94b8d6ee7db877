import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { useToday } from '#src/api/session.ts';
import { useSession } from '#src/api/sessionStore.ts';
import { textQueries } from '#src/api/texts.ts';
import { Chip } from '#src/components/Chip.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { PageHeader } from '#src/components/PageHeader.tsx';
import { LinkedWords } from './LinkedWords.tsx';
import { statusLook, textKindWords, type TextLine } from './textStatus.ts';
import { writeMoment } from './writeMoment.ts';

/** The latest texts of the business, out and in, with what became of each and why. */
export function TextList() {
  const { data, error, refetch } = useQuery({ ...textQueries.latest(), refetchInterval: 15_000 });
  const { fakesActive } = useSession();
  const calls = data?.filter(({ status }) => statusLook[status].tone === 'bad').length ?? 0;
  return (
    <>
      <PageHeader
        title="Texts"
        dim={
          <>
            The last hundred, newest first
            {calls > 0 && ` · ${calls} did not arrive: call these households`}
            {fakesActive && (
              <>
                {' '}
                · nothing leaves this machine: see the{' '}
                <Link className="text-link" to="/fakes/phones">
                  fake phones
                </Link>
              </>
            )}
          </>
        }
      />
      {error && (
        <ErrorNote
          title="The texts could not be loaded"
          error={error}
          onRetry={() => void refetch()}
          className="mb-4"
        />
      )}
      {!data && !error && <Loading words="Loading texts" />}
      {data?.length === 0 && (
        <EmptyState title="No text has gone out yet">
          The first goes out when a groomer starts driving to a household that agreed to texts.
        </EmptyState>
      )}
      {data && data.length > 0 && (
        <ul className="card rows px-4 md:px-5">
          {data.map((text) => (
            <TextRow key={text.id} text={text} />
          ))}
        </ul>
      )}
    </>
  );
}

function TextRow({ text }: { text: TextLine }) {
  const today = useToday();
  const { timeZone } = useSession().business;
  const look = statusLook[text.status];
  const inbound = text.direction === 'in';
  return (
    <li className="grid gap-x-5 gap-y-1.5 py-3.5 md:grid-cols-[210px_1fr_250px]">
      <div className="flex items-baseline justify-between gap-3 md:block">
        <span>
          {text.householdId ? (
            <Link className="text-link" to={`/households/${text.householdId}`}>
              {text.householdName ?? 'household'}
            </Link>
          ) : (
            <b>unknown number</b>
          )}
          <span className="block text-sm text-slate">{text.phone}</span>
        </span>
        <time className="text-sm whitespace-nowrap text-slate" dateTime={text.at}>
          {writeMoment(text.at, timeZone, today)}
        </time>
      </div>
      <p
        className={`rounded-[12px] px-3.5 py-2.5 leading-snug ${
          inbound ? 'mr-6 bg-linen' : 'ml-6 bg-collar-soft md:ml-0'
        }`}
      >
        <span className="block text-[13px]">
          {inbound ? `‹ from them` : `to them ›`} · {textKindWords(text.kind)}
        </span>
        {text.body ? <LinkedWords text={text.body} /> : <i>no words</i>}
      </p>
      <p className="leading-snug">
        {!inbound && <Chip tone={look.tone}>{look.words}</Chip>}
        {text.reason && <span className="mt-1 block text-sm text-slate">{text.reason}</span>}
      </p>
    </li>
  );
}
