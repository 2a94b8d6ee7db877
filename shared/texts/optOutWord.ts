/**
 * Words that end texts: the carriers' defaults and those of 47 CFR 64.1200(a)(10), "stop, quit,
 * end, revoke, opt out, cancel, unsubscribe". YES resumes at the carrier, so it must never be a
 * confirm keyword.
 */
const words = {
  stop: 'STOP STOPALL UNSUBSCRIBE CANCEL END QUIT REVOKE OPTOUT'.split(' '),
  start: 'START UNSTOP YES'.split(' '),
  help: 'HELP INFO'.split(' '),
} as const;

export type OptOutWord = keyof typeof words;

/** What a reply asks for when it is one of the keywords and nothing else, else null. */
export function optOutWord(body: string): OptOutWord | null {
  const said = body.toUpperCase().replace(/[^\p{L}\p{N}]/gu, '');
  for (const [meaning, list] of Object.entries(words))
    if ((list as readonly string[]).includes(said)) return meaning as OptOutWord;
  return null;
}
