import { useState } from 'react';
import type { Review } from '#shared/api/review.ts';
import { bandEdges } from './bandEdges.ts';
import { bandShare, isInside, type BandShare } from './bandShare.ts';
import { niceTop } from './niceTop.ts';
import { useBoxWidth } from './useBoxWidth.ts';

type ReviewVisit = Review['visits'][number];

const H = 300;
const left = 42;
const ground = 262;

/** Forecast minutes against the clock, each visit judged by its own 8-in-10 band. */
export function ForecastScatter({ visits }: { visits: readonly ReviewVisit[] }) {
  const [picked, setPicked] = useState<ReviewVisit | null>(null);
  const [box, W] = useBoxWidth<HTMLElement>(580);
  const edges = bandEdges(visits);
  const most =
    Math.max(
      ...visits.map((visit) => Math.max(visit.forecastSeconds, visit.clockSeconds)),
      ...edges.map((edge) => edge.highSeconds),
    ) / 60;
  const { top, step } = niceTop(most);
  const xOf = (seconds: number) => left + (seconds / 60 / top) * (W - left - 12);
  const yOf = (seconds: number) => ground - (seconds / 60 / top) * (ground - 12);
  const ticks = Array.from({ length: Math.round(top / step) + 1 }, (_, at) => at * step);
  const share = bandShare(visits);
  return (
    <figure ref={box}>
      <p className="text-[15px] text-slate">{shareWords(share)}</p>
      <svg
        viewBox={`0 0 ${W} ${H}`}
        className="mt-1 block h-auto w-full"
        role="img"
        aria-label={`Forecast against clock of ${visits.length} visits: ${shareWords(share)}`}
      >
        {ticks.map((minutes) => (
          <g key={minutes} fontSize={12} fill="var(--slate)">
            <line
              x1={left}
              x2={W - 12}
              y1={yOf(minutes * 60)}
              y2={yOf(minutes * 60)}
              stroke="var(--linen)"
            />
            <text x={left - 7} y={yOf(minutes * 60) + 4} textAnchor="end">
              {minutes}
            </text>
            <text x={xOf(minutes * 60)} y={ground + 17} textAnchor="middle">
              {minutes}
            </text>
          </g>
        ))}
        {edges.length > 1 && (
          <path
            d={`M${edges.map((e) => `${xOf(e.forecastSeconds)} ${yOf(e.highSeconds)}`).join('L')}L${edges
              .toReversed()
              .map((e) => `${xOf(e.forecastSeconds)} ${yOf(e.lowSeconds)}`)
              .join('L')}Z`}
            fill="var(--collar-soft)"
            opacity={0.75}
          />
        )}
        <line
          x1={xOf(0)}
          y1={yOf(0)}
          x2={xOf(top * 60)}
          y2={yOf(top * 60)}
          stroke="var(--collar)"
          strokeWidth={1.5}
        />
        {visits.map((visit) => {
          const x = xOf(visit.forecastSeconds);
          const y = yOf(visit.clockSeconds);
          return (
            <g
              key={visit.visitId}
              onPointerEnter={() => setPicked(visit)}
              onPointerDown={() => setPicked(visit)}
            >
              {isInside(visit) ? (
                <circle cx={x} cy={y} r={4.2} fill="var(--collar)" fillOpacity={0.8} />
              ) : (
                <path
                  d={`M${x} ${y - 5.5}l5.5 9.5h-11z`}
                  fill="#fff"
                  stroke="var(--rosette)"
                  strokeWidth={1.8}
                />
              )}
              <circle cx={x} cy={y} r={9} fill="transparent" />
            </g>
          );
        })}
        <text x={W - 12} y={H - 4} fontSize={12} textAnchor="end" fill="var(--slate)">
          minutes forecast at booking →
        </text>
        <text x={left + 4} y={14} fontSize={12} fill="var(--slate)">
          ↑ minutes by the clock
        </text>
      </svg>
      <figcaption className="text-[13px] text-slate">
        <span className="text-collar">●</span> inside its own band ·{' '}
        <span className="text-rosette">△</span> outside · line: clock equals forecast · pale: the
        usual 8-in-10 band
        {picked && (
          <span className="mt-1 block min-h-6 text-[15px] text-ink">
            {picked.label}, {picked.coatStyle}: forecast {minutes(picked.forecastSeconds)} (
            {minutes(picked.p10Seconds)}–{minutes(picked.p90Seconds)}), clock{' '}
            {minutes(picked.clockSeconds)} min
          </span>
        )}
      </figcaption>
      <ScatterTable visits={visits} />
    </figure>
  );
}

function ScatterTable({ visits }: { visits: readonly ReviewVisit[] }) {
  return (
    <details className="mt-1">
      <summary className="inline-flex min-h-11 items-center text-[15px] font-medium text-slate md:min-h-9">
        <span aria-hidden="true">▸&nbsp;</span>All {visits.length} visits as a table
      </summary>
      <div className="max-h-96 overflow-auto" tabIndex={0} role="region" aria-label="All visits">
        <table className="plain text-[15px]">
          <thead>
            <tr>
              <th scope="col">Visit</th>
              <th scope="col">Coat and style</th>
              {['forecast', '8 in 10', 'clock'].map((words) => (
                <th key={words} scope="col" className="num">
                  {words}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {visits.map((visit) => (
              <tr key={visit.visitId}>
                <td>
                  {visit.label}
                  <span className="block text-sm text-slate">
                    {visit.vanName}, {visit.date}
                  </span>
                </td>
                <td>{visit.coatStyle}</td>
                <td className="num">{minutes(visit.forecastSeconds)}</td>
                <td className="num">
                  {minutes(visit.p10Seconds)}–{minutes(visit.p90Seconds)}
                </td>
                <td className="num">
                  {minutes(visit.clockSeconds)}
                  {!isInside(visit) && <span className="text-rosette"> △</span>}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </details>
  );
}

function shareWords(share: BandShare): string {
  if (share.percent === null) return 'No finished visit to compare yet.';
  const so = `${share.inside} of ${share.visits} visits (${share.percent} %) fell inside their band`;
  switch (share.verdict) {
    case 'tooFew':
      return `${so}; it takes ten visits or more to judge it.`;
    case 'honest':
      return `${so}. An honest band holds 8 in 10; chance allows ${share.fromPercent}–${share.toPercent} %.`;
    case 'tooNarrow':
      return `${so}. That is fewer than chance allows (${share.fromPercent}–${share.toPercent} %): the band is too narrow.`;
    case 'tooWide':
      return `${so}. That is more than chance allows (${share.fromPercent}–${share.toPercent} %): the band is too wide.`;
  }
}

function minutes(seconds: number): number {
  return Math.round(seconds / 60);
}
