import { stepFamily } from './stepFamilies.ts';
import { useStepPaint } from './StripPatterns.tsx';
import type { Tower } from './types.ts';

/** Towers on a ground line at `baseline`. `xOf` and `heightOf` turn a tower's numbers into pixels. */
export function StepTowers({
  towers,
  baseline,
  xOf,
  heightOf,
  faded = false,
  letters = false,
}: {
  towers: readonly Tower[];
  baseline: number;
  xOf: (seconds: number) => number;
  heightOf: (attentionPermille: number) => number;
  faded?: boolean;
  /** Each family's letter, where a zoomed tower has room for it. */
  letters?: boolean;
}) {
  const paint = useStepPaint();
  return (
    <g opacity={faded ? 0.45 : 1}>
      {towers.map((tower) => {
        const x = xOf(tower.fromSeconds) + 0.5;
        const width = Math.max(1, xOf(tower.toSeconds) - x - 0.5);
        const height = heightOf(tower.attentionPermille);
        const about = stepFamily(tower.family);
        return (
          <g key={tower.key} data-tower={tower.key} data-steps={tower.steps.length}>
            <rect
              x={x}
              y={baseline - height}
              width={width}
              height={height}
              rx={Math.min(2, width / 3)}
              fill={paint(tower.family)}
              stroke="var(--ink)"
              strokeWidth={1}
            />
            {letters && width >= 18 && height >= 18 && (
              <g pointerEvents="none">
                {/* Letters stand on a plain ground, or the pattern eats them. */}
                <rect
                  x={x + width / 2 - 6.5}
                  y={baseline - 15.5}
                  width={13}
                  height={12.5}
                  rx={3}
                  fill={about.color}
                />
                <text
                  x={x + width / 2}
                  y={baseline - 5.6}
                  fontSize={10}
                  fontWeight={600}
                  textAnchor="middle"
                  fill={about.letterColor}
                >
                  {about.letter}
                </text>
              </g>
            )}
          </g>
        );
      })}
    </g>
  );
}
