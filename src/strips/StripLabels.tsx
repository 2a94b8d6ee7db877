import { memo, type ReactNode } from 'react';
import type { StripRow } from './stripLayout.ts';
import { ShapeMark, type MarkShape } from '#src/components/ShapeMark.tsx';
import type { Strip } from './types.ts';

export interface VanMark {
  shape: MarkShape;
  color: string;
  /** "sent 7:12", "changed since sent"; null when nothing was sent. */
  sentWords: string | null;
  changed: boolean;
}

/** The column left of the strips: van, groomer, water, and what its phone has. */
export const StripLabels = memo(function StripLabels({
  strips,
  rows,
  marks,
  distanceWords,
  heightPx,
}: {
  strips: readonly Strip[];
  rows: readonly StripRow[];
  marks: ReadonlyMap<string, VanMark>;
  distanceWords: (metres: number) => string;
  heightPx: number;
}) {
  return (
    <div className="relative w-[148px] shrink-0" style={{ height: heightPx }}>
      {strips.map((strip, index) => {
        const row = rows[index]!;
        return (
          <div
            key={strip.vanId}
            className="absolute inset-x-0 pr-2"
            style={{ top: row.baseline - (row.compact ? 30 : 44) }}
          >
            <VanLabel
              strip={strip}
              mark={marks.get(strip.vanId)}
              distanceWords={distanceWords}
              compact={row.compact}
            />
          </div>
        );
      })}
    </div>
  );
});

/** One van in words; also the head of the strip on a phone. */
export function VanLabel({
  strip,
  mark,
  distanceWords,
  compact,
}: {
  strip: Strip;
  mark: VanMark | undefined;
  distanceWords: (metres: number) => string;
  compact: boolean;
}) {
  return (
    <>
      <p className="flex items-center gap-1.5 text-[16px] leading-tight font-bold">
        {mark && (
          <span style={{ color: mark.color }}>
            <ShapeMark shape={mark.shape} />
          </span>
        )}
        <span className="truncate">{strip.vanName}</span>
      </p>
      <Small>
        {strip.groomerName} · {distanceWords(strip.driveMetres)}
      </Small>
      {!compact && strip.water && <WaterBar water={strip.water} />}
      {mark?.sentWords && (
        <p
          className={`truncate text-[11px] leading-4 ${mark.changed ? 'font-semibold text-liver' : 'text-slate'}`}
        >
          {mark.changed ? '△ ' : '✓ '}
          {mark.sentWords}
        </p>
      )}
    </>
  );
}

function WaterBar({ water }: { water: NonNullable<Strip['water']> }) {
  const permille = Math.round((1000 * water.usedMl) / Math.max(1, water.capacityMl));
  const over = permille > 1000;
  return (
    <>
      <div className="mt-1 h-1.5 w-[84px] overflow-hidden rounded-full bg-linen">
        <div
          className={`h-full rounded-full ${over ? 'bg-rosette' : 'bg-mint'}`}
          style={{ width: `${Math.min(100, permille / 10)}%` }}
        />
      </div>
      <p className={`mt-0.5 text-[11px] leading-4 ${over ? 'text-rosette' : 'text-slate'}`}>
        {waterWords(water)}
      </p>
    </>
  );
}

/** 'water 170 of 260 L', or how often it is filled up. */
export function waterWords(water: NonNullable<Strip['water']>): string {
  if (water.refills === 1) return 'water refill once';
  if (water.refills > 1) return `water refill ${water.refills} times`;
  const over = water.usedMl > water.capacityMl ? '▲ ' : '';
  return `${over}water ${Math.round(water.usedMl / 1000)} of ${Math.round(water.capacityMl / 1000)} L`;
}

function Small({ children }: { children: ReactNode }) {
  return <p className="truncate text-[12.5px] leading-[18px] text-slate">{children}</p>;
}
