import { useId } from 'react';
import type { Review } from '#shared/api/review.ts';
import { niceTop } from './niceTop.ts';
import { hoursWords } from './reviewWords.ts';
import { useBoxWidth } from './useBoxWidth.ts';

type ReviewDay = Review['days'][number];

const parts = [
  { key: 'other', words: 'other grooming' },
  { key: 'scissor', words: 'scissor' },
  { key: 'drive', words: 'driving' },
  { key: 'wait', words: 'waiting' },
] as const;
type PartKey = (typeof parts)[number]['key'];

const H = 262;
const left = 34;
const ground = 226;
/** Less than this is 0.0 h, a number on the ground line that says nothing. */
const WORTH_A_NUMBER = 0.05 * 3600;

/** Hours of each day as stacked bars; each part has a pattern of its own. */
export function DayBars({ days }: { days: readonly ReviewDay[] }) {
  const [box, W] = useBoxWidth<HTMLElement>(700);
  const id = useId().replace(/[^a-zA-Z0-9]/g, '');
  const paint = paints(id);
  const most = Math.max(...days.map((day) => sum(day))) / 3600;
  const { top, step } = niceTop(most);
  const yOf = (hours: number) => ground - (hours / top) * (ground - 14);
  const slot = (W - left - 6) / days.length;
  const width = Math.min(62, slot * 0.56);
  // On a phone the numbers beside the bars would run into each other: the table has them.
  const roomForNumbers = slot - width > 34;
  const ticks = Array.from({ length: Math.round(top / step) + 1 }, (_, at) => at * step);
  return (
    <figure ref={box}>
      <svg viewBox={`0 0 ${W} ${H}`} className="block h-auto w-full" aria-hidden="true">
        <Patterns id={id} />
        {ticks.map((hours) => (
          <g key={hours}>
            <line x1={left} x2={W} y1={yOf(hours)} y2={yOf(hours)} stroke="var(--linen)" />
            <text
              x={left - 8}
              y={yOf(hours) + 4}
              fontSize={12}
              textAnchor="end"
              fill="var(--slate)"
            >
              {hours}
            </text>
          </g>
        ))}
        {days.map((day, index) => {
          const x = left + slot * (index + 0.5) - width / 2 - (roomForNumbers ? 8 : 0);
          let base = 0;
          return (
            <g key={day.date}>
              {parts.map(({ key }) => {
                const hours = secondsOf(day, key) / 3600;
                const y = yOf(base + hours);
                const height = yOf(base) - y;
                base += hours;
                return (
                  height > 0.5 && (
                    <rect
                      key={key}
                      x={x}
                      y={y}
                      width={width}
                      height={height}
                      fill={paint[key]}
                      stroke="var(--ink)"
                      strokeWidth={1}
                    />
                  )
                );
              })}
              {roomForNumbers && day.groomSeconds >= WORTH_A_NUMBER && (
                <text
                  x={x + width + 5}
                  y={yOf(day.groomSeconds / 7200) + 4}
                  fontSize={12.5}
                  fill="var(--ink)"
                >
                  {(day.groomSeconds / 3600).toFixed(1)}
                </text>
              )}
              {roomForNumbers && day.driveSeconds >= WORTH_A_NUMBER && (
                <text
                  x={x + width + 5}
                  y={yOf((day.groomSeconds + day.driveSeconds / 2) / 3600) + 4}
                  fontSize={12.5}
                  fill="var(--slate)"
                >
                  {(day.driveSeconds / 3600).toFixed(1)}
                </text>
              )}
              <text
                x={x + width / 2}
                y={ground + 20}
                fontSize={13}
                textAnchor="middle"
                fill="var(--ink)"
              >
                {weekday(day.date, 'short')}
              </text>
            </g>
          );
        })}
        <line x1={left} x2={W} y1={ground} y2={ground} stroke="var(--ink)" strokeWidth={1.5} />
      </svg>
      <figcaption>
        <ul className="flex flex-wrap gap-x-4 gap-y-1 text-[13px] text-slate">
          {parts.map(({ key, words }) => (
            <li key={key} className="inline-flex items-center gap-1.5">
              <svg width="13" height="13" aria-hidden="true">
                <rect
                  x=".5"
                  y=".5"
                  width="12"
                  height="12"
                  rx="2"
                  fill={paint[key]}
                  stroke="var(--ink)"
                />
              </svg>
              {words}
            </li>
          ))}
        </ul>
      </figcaption>
      <BarTable days={days} />
    </figure>
  );
}

/** The same numbers for whoever listens or wants them exact. */
function BarTable({ days }: { days: readonly ReviewDay[] }) {
  return (
    <details className="mt-1">
      <summary className="inline-flex min-h-11 items-center text-[15px] font-medium text-slate md:min-h-9">
        <span aria-hidden="true">▸&nbsp;</span>As a table
      </summary>
      <div className="overflow-x-auto">
        <table className="plain text-[15px]">
          <caption className="sr-only">Where each day went, all vans</caption>
          <thead>
            <tr>
              <th scope="col">Day</th>
              {['grooming', 'of it scissor', 'driving', 'waiting', 'visits'].map((words) => (
                <th key={words} scope="col" className="num">
                  {words}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {days.map((day) => (
              <tr key={day.date}>
                <th scope="row" className="border-t border-linen !text-[15px] !text-ink">
                  {weekday(day.date, 'long')}
                </th>
                <td className="num">{hoursWords(day.groomSeconds)}</td>
                <td className="num">{hoursWords(day.scissorSeconds)}</td>
                <td className="num">{hoursWords(day.driveSeconds)}</td>
                <td className="num">{hoursWords(day.waitSeconds)}</td>
                <td className="num">{day.visits}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </details>
  );
}

function Patterns({ id }: { id: string }) {
  return (
    <defs>
      <pattern
        id={`${id}-scissor`}
        width="6"
        height="6"
        patternUnits="userSpaceOnUse"
        patternTransform="rotate(35)"
      >
        <rect width="6" height="6" fill="var(--apricot)" />
        <rect width="2" height="6" fill="#f7c9a6" />
      </pattern>
      <pattern id={`${id}-drive`} width="6" height="6" patternUnits="userSpaceOnUse">
        <rect width="6" height="6" fill="var(--merle)" />
        <circle cx="3" cy="3" r="1" fill="#dbe3ea" />
      </pattern>
    </defs>
  );
}

function paints(id: string): Record<PartKey, string> {
  return {
    other: 'var(--collar)',
    scissor: `url(#${id}-scissor)`,
    drive: `url(#${id}-drive)`,
    wait: 'var(--fawn)',
  };
}

function secondsOf(day: ReviewDay, key: PartKey): number {
  if (key === 'other') return day.groomSeconds - day.scissorSeconds;
  if (key === 'scissor') return day.scissorSeconds;
  return key === 'drive' ? day.driveSeconds : day.waitSeconds;
}

function sum(day: ReviewDay): number {
  return day.groomSeconds + day.driveSeconds + day.waitSeconds;
}

function weekday(date: string, style: 'short' | 'long'): string {
  return new Intl.DateTimeFormat('en-GB', { weekday: style, timeZone: 'UTC' }).format(
    new Date(`${date}T00:00:00Z`),
  );
}
