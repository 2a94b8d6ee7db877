import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { z } from 'zod';
import type { listFakePhones } from '#shared/api/texts.ts';
import { textQueries, useReplyFromFakePhone } from '#src/api/texts.ts';
import { Button } from '#src/components/Button.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { FakeFrame } from './FakeFrame.tsx';
import { LinkedWords } from './LinkedWords.tsx';

type FakePhone = z.infer<typeof listFakePhones.response>[number];

/** Every number the fake carrier knows, latest talk first, with a box to answer from it. */
export function FakePhones() {
  const { data, error } = useQuery({ ...textQueries.fakePhones(), refetchInterval: 2_000 });
  const phones = data?.toSorted((a, b) => latest(b).localeCompare(latest(a)));
  return (
    <FakeFrame
      title="Fake phones"
      said="these texts went to a pretend carrier on this machine, to nobody’s phone"
      error={error}
    >
      {!phones && <Loading words="Loading the fake phones" />}
      {phones?.length === 0 && (
        <EmptyState title="No phone has heard anything yet">
          Start driving on a run whose household agreed to texts; the text shows here within
          seconds.
        </EmptyState>
      )}
      <ul className="grid gap-5 sm:grid-cols-2 lg:grid-cols-3 xl:grid-cols-4">
        {phones?.map((phone) => (
          <li key={phone.phone}>
            <Phone phone={phone} />
          </li>
        ))}
      </ul>
    </FakeFrame>
  );
}

function Phone({ phone }: { phone: FakePhone }) {
  const reply = useReplyFromFakePhone();
  const [words, setWords] = useState('');
  const texts = phone.texts.toSorted((a, b) => a.at.localeCompare(b.at));
  return (
    <section
      aria-label={`Phone ${phone.phone}`}
      className="flex h-[26rem] flex-col overflow-hidden rounded-[26px] border-2 border-ink bg-white"
    >
      <h2 className="border-b border-fawn bg-linen px-4 py-2.5 text-[15px] font-semibold">
        {phone.phone}
      </h2>
      <ol className="flex flex-1 flex-col-reverse gap-2 overflow-y-auto px-3 py-3" tabIndex={0}>
        {texts.toReversed().map((text) => (
          <li
            key={text.sid}
            className={`max-w-[88%] rounded-[16px] px-3.5 py-2.5 text-[15px] leading-snug ${
              text.direction === 'out'
                ? 'self-start bg-collar-soft'
                : 'self-end bg-collar text-white'
            }`}
          >
            <LinkedWords text={text.body} />
            <span
              className={`mt-1 block text-xs ${text.direction === 'out' ? 'text-ink' : 'text-white'}`}
            >
              {new Date(text.at).toLocaleTimeString('en-GB')} · {text.status}
            </span>
          </li>
        ))}
      </ol>
      {reply.error && <ErrorNote error={reply.error} className="mx-3 mb-2" />}
      <form
        className="flex gap-2 border-t border-fawn p-2.5"
        onSubmit={(event) => {
          event.preventDefault();
          const body = words.trim();
          if (body)
            reply.mutate({ body: { phone: phone.phone, body } }, { onSuccess: () => setWords('') });
        }}
      >
        <input
          className="entry"
          aria-label={`Answer from ${phone.phone}`}
          placeholder="Answer, or STOP"
          value={words}
          maxLength={1600}
          onChange={(event) => setWords(event.target.value)}
        />
        <Button type="submit" kind="go" busy={reply.isPending}>
          Send
        </Button>
      </form>
    </section>
  );
}

function latest(phone: FakePhone): string {
  return phone.texts.reduce((newest, { at }) => (at > newest ? at : newest), '');
}
