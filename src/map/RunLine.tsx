import { Polyline } from 'react-leaflet';

/** How a van's line is told from the others without colour. */
export const LINE_DASHES = { solid: undefined, dashed: '11 8', dotted: '1 8', dashdot: '12 7 1 7' };

export type LineDash = keyof typeof LINE_DASHES;

/** Vans in order take these in turn, as the strips do with their marks. */
export const DASH_ORDER: readonly LineDash[] = ['solid', 'dashed', 'dotted', 'dashdot'];

/** A run, or one leg of it, along the roads. Never takes a click from what lies beneath. */
export function RunLine({
  line,
  colour,
  dash = 'solid',
  faint = false,
}: {
  line: readonly (readonly [lat: number, lon: number])[];
  colour: string;
  dash?: LineDash;
  /** Driven already, or a guess in a straight line. */
  faint?: boolean;
}) {
  const positions = line.map(([lat, lon]) => [lat, lon] as [number, number]);
  const weight = dash === 'dotted' ? 5 : 4;
  return (
    <>
      <Polyline
        positions={positions}
        interactive={false}
        pathOptions={{ color: 'white', weight: weight + 3.5, opacity: faint ? 0.4 : 0.85 }}
      />
      <Polyline
        positions={positions}
        interactive={false}
        pathOptions={{
          color: colour,
          weight,
          opacity: faint ? 0.45 : 1,
          lineCap: 'round',
          lineJoin: 'round',
          dashArray: LINE_DASHES[dash],
        }}
      />
    </>
  );
}
