import { useState, type ComponentProps, type ReactNode } from 'react';
import { ShapeMark } from '#src/components/ShapeMark.tsx';
import { DayStrips } from '#src/strips/DayStrips.tsx';
import { StripLegend } from '#src/strips/StripLegend.tsx';
import { VanLabel } from '#src/strips/StripLabels.tsx';

type StripsProps = Omit<ComponentProps<typeof DayStrips>, 'zoom' | 'bare'>;

/** The strips in their card: zoom and legend; on a phone one van at a time with its own tabs. */
export function StripsCard({
  narrow,
  vanId,
  onVan,
  title,
  actions,
  ...strips
}: StripsProps & {
  narrow: boolean;
  /** The van shown on a phone. */
  vanId: string | null;
  onVan: (vanId: string) => void;
  /** Said above the strips while they show something else than the day as it is. */
  title: string | null;
  /** What can be done about it, next to the words. */
  actions?: ReactNode;
}) {
  const [zoom, setZoom] = useState(1);
  const shown = narrow
    ? strips.strips.filter((strip, index) => strip.vanId === vanId || (!vanId && index === 0))
    : strips.strips;
  const one = shown[0];
  return (
    <section className="card px-3 pt-2 pb-3 md:px-5" aria-label="Vans">
      {title && (
        <div className="-mx-3 -mt-2 mb-1 flex flex-wrap items-center justify-between gap-x-4 gap-y-2 rounded-t-[13px] bg-collar-soft px-4 py-1.5 md:-mx-5 md:px-5">
          <p className="min-h-6 text-[15px] font-semibold text-collar">{title}</p>
          {actions}
        </div>
      )}
      {narrow && (
        <div
          role="group"
          aria-label="Van"
          className="-mx-1 mb-2 flex gap-1 overflow-x-auto px-1 py-1"
        >
          {strips.strips.map((strip) => {
            const mark = strips.marks.get(strip.vanId);
            const here = strip === one;
            return (
              <button
                key={strip.vanId}
                type="button"
                aria-pressed={here}
                onClick={() => onVan(strip.vanId)}
                className={`inline-flex min-h-11 shrink-0 items-center gap-1.5 rounded-[10px] border px-3 font-semibold ${
                  here ? 'border-collar bg-collar-soft' : 'border-fawn bg-white'
                }`}
              >
                {mark && (
                  <span style={{ color: mark.color }}>
                    <ShapeMark shape={mark.shape} />
                  </span>
                )}
                {strip.vanName}
                {strip.stops.some((stop) => stop.atRisk) && (
                  <span className="text-rosette" aria-label="promise at risk">
                    ▲
                  </span>
                )}
              </button>
            );
          })}
        </div>
      )}
      {narrow && one && (
        <div className="mb-1">
          <VanLabel
            strip={one}
            mark={strips.marks.get(one.vanId)}
            distanceWords={strips.distanceWords}
            compact={false}
          />
        </div>
      )}
      <DayStrips {...strips} strips={shown} zoom={zoom} bare={narrow} />
      {narrow ? (
        <details className="mt-1">
          <summary className="min-h-11 content-center text-[15px] text-slate">
            What the marks mean
          </summary>
          <StripLegend />
        </details>
      ) : (
        <div className="mt-1 flex flex-wrap items-center justify-between gap-x-6 gap-y-2">
          <StripLegend />
          <Zoom zoom={zoom} onZoom={setZoom} />
        </div>
      )}
    </section>
  );
}

function Zoom({ zoom, onZoom }: { zoom: number; onZoom: (zoom: number) => void }) {
  return (
    <div role="group" aria-label="Zoom" className="flex gap-1">
      {[1, 2, 4].map((step) => (
        <button
          key={step}
          type="button"
          aria-pressed={zoom === step}
          onClick={() => onZoom(step)}
          className={`min-h-9 rounded-lg px-2.5 text-[13px] ${
            zoom === step ? 'bg-linen font-semibold' : 'text-slate hover:bg-linen'
          }`}
        >
          {step === 1 ? 'whole day' : `${step} ×`}
        </button>
      ))}
    </div>
  );
}
