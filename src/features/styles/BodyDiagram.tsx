import { useRef, type KeyboardEvent } from 'react';
import type { Region, Species, Style } from '#shared/grooming/types.ts';
import { usePatternId } from '#src/strips/StripPatterns.tsx';
import { useBoxWidth } from '#src/strips/useBoxWidth.ts';
import { bodyDrawings, regionOrder } from './bodyShapes.ts';
import { cutWords } from './cutWords.ts';
import { RegionLabel, RegionNumber } from './RegionLabel.tsx';
import { RegionPatterns } from './RegionPatterns.tsx';

/** Below this the labels would be too small to read: numbers instead, as in the table. */
const LABELS_FROM_PX = 500;

/**
 * A dog or a cat from the side, each region painted by its cut. With `onPick` the regions are
 * buttons: Tab and the arrows walk over the body from head to tail, Enter or a tap picks one.
 */
export function BodyDiagram({
  species,
  cuts,
  picked = null,
  onPick,
}: {
  species: Species;
  cuts: Style['cuts'];
  picked?: Region | null;
  onPick?: (region: Region) => void;
}) {
  const id = usePatternId();
  const box = useRef<HTMLDivElement>(null);
  const nodes = useRef(new Map<Region, SVGGElement>());
  const drawing = bodyDrawings[species];
  const labelled = useBoxWidth(box) >= LABELS_FROM_PX;
  const press = (event: KeyboardEvent, region: Region) => {
    const next = nextRegion(event.key, region);
    if (next) nodes.current.get(next)?.focus();
    else if (event.key === 'Enter' || event.key === ' ') onPick?.(region);
    else return;
    event.preventDefault();
  };
  const said = (region: Region) => {
    const words = cutWords(cuts, region);
    return [words.region, words.tool, words.direction, words.left].filter(Boolean).join(', ');
  };
  return (
    <div ref={box} className="body-diagram">
      <svg
        viewBox={labelled ? '-64 -44 658 394' : '58 8 410 292'}
        className="block h-auto w-full"
        role={onPick ? 'group' : 'img'}
        aria-label={
          onPick
            ? `Regions of the ${species}`
            : `Cut plan of the ${species}: ${regionOrder.map(said).join('; ')}`
        }
      >
        <RegionPatterns id={id} cuts={cuts} />
        <path d="M70 288.5H380" stroke="var(--fawn)" strokeWidth="2" strokeLinecap="round" />
        <g aria-hidden="true">
          {drawing.order.map((region) => (
            <g
              key={region}
              className={`body-region ${onPick ? 'body-pickable' : ''} ${
                cuts[region]?.tool === 'leave' ? 'body-left' : ''
              }`}
              onClick={onPick && (() => onPick(region))}
            >
              {drawing.shapes[region].far && (
                <path
                  d={drawing.shapes[region].far}
                  fill={`url(#${id}-${region})`}
                  opacity="0.62"
                />
              )}
              <path d={drawing.shapes[region].near} fill={`url(#${id}-${region})`} />
            </g>
          ))}
        </g>
        <g pointerEvents="none">
          <ellipse cx={drawing.eye[0]} cy={drawing.eye[1]} rx="4.6" ry="5.4" fill="var(--ink)" />
          <path d={drawing.nose} fill="var(--ink)" />
          {drawing.lines.map((line) => (
            <path
              key={line}
              d={line}
              fill="none"
              stroke="var(--ink)"
              strokeWidth="1.8"
              strokeLinecap="round"
            />
          ))}
          {picked && (
            <path
              d={drawing.shapes[picked].near}
              fill="none"
              stroke="var(--rosette)"
              strokeWidth="4"
            />
          )}
        </g>
        {/* Buttons of their own: in the order of the body, not of the paint, and their outline on
            top of the neighbours, which would cover half of it. A pointer picks the paint itself. */}
        {onPick &&
          regionOrder.map((region) => (
            <g
              key={region}
              ref={(node) => {
                if (node) nodes.current.set(region, node);
              }}
              className="body-button"
              pointerEvents="none"
              role="button"
              tabIndex={0}
              aria-label={said(region)}
              aria-pressed={picked === region}
              onClick={() => onPick(region)}
              onKeyDown={(event) => press(event, region)}
            >
              <path d={drawing.shapes[region].near} fill="none" />
            </g>
          ))}
        <g aria-hidden="true">
          {regionOrder.map((region, index) =>
            labelled ? (
              <RegionLabel
                key={region}
                shape={drawing.shapes[region]}
                words={cutWords(cuts, region)}
                picked={picked === region}
                onPick={onPick && (() => onPick(region))}
              />
            ) : (
              <RegionNumber key={region} shape={drawing.shapes[region]} number={index + 1} />
            ),
          )}
        </g>
      </svg>
    </div>
  );
}

function nextRegion(key: string, from: Region): Region | null {
  const at = regionOrder.indexOf(from);
  const last = regionOrder.length - 1;
  if (key === 'ArrowRight' || key === 'ArrowDown') return regionOrder[at === last ? 0 : at + 1]!;
  if (key === 'ArrowLeft' || key === 'ArrowUp') return regionOrder[at === 0 ? last : at - 1]!;
  if (key === 'Home') return regionOrder[0]!;
  return key === 'End' ? regionOrder[last]! : null;
}
