import type { Standing } from './stopStanding.ts';

export function StandingWords({ standing }: { standing: Standing | null }) {
  if (!standing) return null;
  const bad = standing.tone === 'bad';
  return (
    <span className={`font-semibold whitespace-nowrap ${bad ? 'text-rosette' : 'text-collar'}`}>
      <span aria-hidden="true">{bad ? '▲ ' : '✓ '}</span>
      {standing.words}
    </span>
  );
}
