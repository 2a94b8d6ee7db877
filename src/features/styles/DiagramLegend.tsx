import { useId } from 'react';
import { lengthTint, scissorTint } from './lengthTint.ts';
import { RegionPatterns } from './RegionPatterns.tsx';
import type { Style } from '#shared/grooming/types.ts';

/** One region for each tool, so that the legend is painted as the body is. */
const sample: Style['cuts'] = {
  back: { tool: 'blade', lengthTenthsMm: 32, direction: 'with' },
  neck: { tool: 'comb', lengthTenthsMm: 130, direction: 'with' },
  head: { tool: 'scissor', lengthTenthsMm: 300 },
  tail: { tool: 'strip' },
  ears: { tool: 'leave' },
};

const tools = [
  ['back', 'blade'],
  ['neck', 'guide comb'],
  ['head', 'scissors'],
  ['tail', 'hand-strip'],
  ['ears', 'kept long'],
  ['feet', 'not touched'],
] as const;

/** How tools and lengths are painted. */
export function DiagramLegend() {
  const id = useId().replace(/[^a-zA-Z0-9]/g, '');
  return (
    <div className="mt-1 flex flex-wrap items-center gap-x-4 gap-y-1.5 text-[13.5px] text-slate">
      {tools.map(([region, words], index) => (
        <span key={region} className="inline-flex items-center gap-1.5">
          <svg width="26" height="18" aria-hidden="true">
            {index === 0 && <RegionPatterns id={id} cuts={sample} />}
            <rect
              x="1"
              y="1"
              width="24"
              height="16"
              rx="4"
              fill={`url(#${id}-${region})`}
              stroke="var(--ink)"
              strokeDasharray={region === 'ears' ? '3 2.5' : undefined}
            />
          </svg>
          {words}
        </span>
      ))}
      <span className="inline-flex items-center gap-1.5">
        short
        <span aria-hidden="true" className="inline-flex">
          {[20, 60, 130, 300].map((length) => (
            <span
              key={length}
              className="inline-block h-3.5 w-3.5"
              style={{ background: lengthTint(length) }}
            />
          ))}
          {[100, 300, 600].map((length) => (
            <span
              key={length}
              className="inline-block h-3.5 w-3.5"
              style={{ background: scissorTint(length) }}
            />
          ))}
        </span>
        long
      </span>
    </div>
  );
}
