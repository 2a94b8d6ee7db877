import type { ReactNode } from 'react';
import { stepFamilies } from './stepFamilies.ts';
import { PatternScope, StripPatterns, usePatternId, useStepPaint } from './StripPatterns.tsx';

/** What every mark of the strips means. */
export function StripLegend() {
  const id = usePatternId();
  return (
    <ul className="flex flex-wrap gap-x-4 gap-y-1 text-[12.5px] text-slate" aria-label="Legend">
      <PatternScope value={id}>
        <li className="contents">
          <svg width="0" height="0" className="absolute" aria-hidden="true">
            <StripPatterns id={id} />
          </svg>
        </li>
        {stepFamilies.map((one) => (
          <Entry key={one.family} words={one.words}>
            <FamilySwatch family={one.family} />
          </Entry>
        ))}
      </PatternScope>
      <Entry words="drive">
        <path
          d="M1 8H21"
          stroke="var(--merle)"
          strokeWidth="2.5"
          strokeDasharray="1 5"
          strokeLinecap="round"
        />
      </Entry>
      <Entry words="waiting">
        <path d="M2 3v8m0 -4H20" stroke="#B9A98A" strokeWidth="1.2" fill="none" />
      </Entry>
      <Entry words="promised window">
        <path d="M1.5 11V5H20.5V11" stroke="#B9A98A" strokeWidth="1.6" fill="none" />
      </Entry>
      <Entry words="arrival, 1 in 10 earlier to 1 in 10 later">
        <path d="M4 7H18" stroke="var(--collar)" strokeWidth="5" strokeLinecap="round" />
      </Entry>
      <Entry words="refill">
        <g>
          <circle cx="11" cy="7" r="6" fill="var(--mint)" stroke="var(--ink)" />
          <path d="M8 7h6m-3 -3v6" stroke="var(--ink)" strokeWidth="1.3" />
        </g>
      </Entry>
    </ul>
  );
}

function Entry({ words, children }: { words: string; children: ReactNode }) {
  return (
    <li className="inline-flex items-center gap-1.5">
      <svg width="22" height="14" viewBox="0 0 22 14" aria-hidden="true">
        {children}
      </svg>
      {words}
    </li>
  );
}

function FamilySwatch({ family }: { family: (typeof stepFamilies)[number]['family'] }) {
  const paint = useStepPaint();
  return (
    <rect
      x="4.5"
      y="0.5"
      width="13"
      height="13"
      rx="2.5"
      fill={paint(family)}
      stroke="var(--ink)"
    />
  );
}
