import type { BodyShape } from './bodyShapes.ts';
import type { CutWords } from './cutWords.ts';

/** A region's words beside the body with a line to it. */
export function RegionLabel({
  shape: { spot, label },
  words,
  picked,
  onPick,
}: {
  shape: BodyShape;
  words: CutWords;
  picked: boolean;
  onPick?: (() => void) | undefined;
}) {
  const [x, y] = label.at;
  const from = lineStart(label);
  return (
    <g onClick={onPick} className={onPick ? 'cursor-pointer' : ''}>
      <path
        d={`M${from.join(' ')}L${spot.join(' ')}`}
        stroke="var(--ink)"
        strokeWidth="1"
        opacity="0.7"
      />
      <circle cx={spot[0]} cy={spot[1]} r="3" fill="#fff" stroke="var(--ink)" />
      <text textAnchor={label.anchor} fill="var(--ink)" fontSize="16.5">
        <tspan x={x} y={y} fontWeight={picked ? 700 : 600}>
          {words.region}
        </tspan>
        <tspan x={x} y={y + 19} fill="var(--slate)">
          {words.label}
        </tspan>
      </text>
    </g>
  );
}

/** On a small drawing only the number, the words standing in the table. */
export function RegionNumber({ shape: { spot }, number }: { shape: BodyShape; number: number }) {
  return (
    <g pointerEvents="none">
      <circle cx={spot[0]} cy={spot[1]} r="10.5" fill="#fff" stroke="var(--ink)" />
      <text
        x={spot[0]}
        y={spot[1] + 5}
        textAnchor="middle"
        fontSize="14"
        fontWeight="600"
        fill="var(--ink)"
      >
        {number}
      </text>
    </g>
  );
}

/** The line leaves the text on the side of the body. */
function lineStart({ at: [x, y], anchor }: BodyShape['label']): [number, number] {
  if (anchor === 'start') return [x - 8, y + 3];
  if (anchor === 'end') return [x + 8, y + 3];
  return y > 150 ? [x, y - 18] : [x, y + 26];
}
