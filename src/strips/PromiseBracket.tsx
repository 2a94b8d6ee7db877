import { bracketY, type StripRow } from './stripLayout.ts';
import { xOf, type TimeAxis } from './timeAxis.ts';
import type { StripStop } from './types.ts';

/**
 * The promised window as a bracket, and in it the arrival from the 1-in-10 early to the 1-in-10
 * late; once the van is there, a dot at the moment it came.
 */
export function PromiseBracket({
  stop,
  row,
  axis,
}: {
  stop: StripStop;
  row: StripRow;
  axis: TimeAxis;
}) {
  const y = bracketY(row, stop.promise?.level ?? 0);
  const color = stop.atRisk ? 'var(--rosette)' : 'var(--collar)';
  const came = stop.state !== 'ahead' && stop.state !== 'driving';
  const from = stop.promise ? xOf(axis, stop.promise.startSeconds) + 1.5 : 0;
  const to = stop.promise ? xOf(axis, stop.promise.endSeconds) - 1.5 : 0;
  // An arrival wholly before its window is tied to it: that van will wait.
  const gap = stop.arrival ? from - xOf(axis, stop.arrival.lateSeconds) : 0;
  return (
    <g pointerEvents="none">
      {stop.promise && (
        <path
          d={`M${from} ${y + 6}V${y}H${to}V${y + 6}`}
          fill="none"
          stroke={stop.atRisk ? 'var(--rosette)' : '#B9A98A'}
          strokeWidth={1.6}
        />
      )}
      {stop.promise && stop.arrival && !came && gap > 1 && (
        <line
          x1={xOf(axis, stop.arrival.lateSeconds)}
          x2={from}
          y1={y + 3.5}
          y2={y + 3.5}
          stroke={color}
          strokeDasharray="2 3"
        />
      )}
      {stop.arrival && came && (
        <circle cx={xOf(axis, stop.arrival.meanSeconds)} cy={y + 3.5} r={3.2} fill={color} />
      )}
      {stop.arrival && !came && (
        <line
          x1={xOf(axis, stop.arrival.earlySeconds)}
          x2={Math.max(
            xOf(axis, stop.arrival.lateSeconds),
            xOf(axis, stop.arrival.earlySeconds) + 2,
          )}
          y1={y + 3.5}
          y2={y + 3.5}
          stroke={stop.promise ? color : 'var(--merle)'}
          strokeWidth={5}
          strokeLinecap="round"
        />
      )}
    </g>
  );
}
