import type { Feature, PaintRule } from 'protomaps-leaflet';
import type * as Protomaps from 'protomaps-leaflet';
import type { LAYER_ZOOMS } from '#tiles/layers.ts';
import { MAP } from './mapColours.ts';

type Kind<Layer extends keyof typeof LAYER_ZOOMS> = keyof (typeof LAYER_ZOOMS)[Layer];
type RoadKind = Kind<'road'>;
type Stops = number[][];

const kindIs = (kind: string) => (_zoom: number, feature: Feature) => feature.props.kind === kind;

/** Width in pixels by zoom; grows with the ground between the stops. */
const ROAD_WIDTHS: Readonly<Partial<Record<RoadKind, Stops>>> = {
  trunk: [[9, 1.2], [12, 3.2], [14, 6], [16, 12], [18, 30]],
  motorway: [[9, 1.4], [12, 3.6], [14, 7], [16, 14], [18, 34]],
  primary: [[9, 0.9], [12, 2.6], [14, 5.4], [16, 11.5], [18, 28]],
  secondary: [[10, 0.8], [12, 2.1], [14, 4.6], [16, 10.5], [18, 26]],
  tertiary: [[11, 0.8], [12, 1.7], [14, 4], [16, 9.5], [18, 24]],
  street: [[12, 0.8], [13, 1.3], [14, 2.6], [16, 7.5], [18, 22]],
  service: [[14, 0.8], [16, 3.4], [18, 11]],
}; // prettier-ignore

/** From the least to the greatest, so that main roads lie on top. */
const ROAD_ORDER: readonly RoadKind[] = [
  'service',
  'street',
  'tertiary',
  'secondary',
  'primary',
  'trunk',
  'motorway',
];

const GROUND: readonly (readonly [Kind<'ground'>, string])[] = [
  ['farm', MAP.farm],
  ['built', MAP.built],
  ['grass', MAP.grass],
  ['wood', MAP.wood],
  ['park', MAP.park],
  ['yard', MAP.yard],
  ['pitch', MAP.pitch],
  ['sand', MAP.sand],
];

/** How the ground is painted, bottom first. */
export function paintRules(protomaps: typeof Protomaps): PaintRule[] {
  const { LineSymbolizer, PolygonSymbolizer, exp } = protomaps;
  const fill = (dataLayer: string, kind: string, colour: string, minzoom = 0): PaintRule => ({
    dataLayer,
    minzoom,
    filter: kindIs(kind),
    symbolizer: new PolygonSymbolizer({ fill: colour }),
  });
  const stroke = (
    dataLayer: string,
    kind: string,
    color: string,
    stops: Stops,
    more: Partial<PaintRule> & { dash?: number[]; cap?: CanvasLineCap } = {},
  ): PaintRule => ({
    dataLayer,
    filter: kindIs(kind),
    ...more,
    symbolizer: new LineSymbolizer({
      color,
      width: exp(1.5, stops),
      lineJoin: 'round',
      lineCap: more.cap ?? 'round',
      ...(more.dash && { dash: more.dash }),
    }),
  });

  const roads = (bridges: boolean): PaintRule[] => {
    const onLevel = (kind: RoadKind) => (_zoom: number, { props }: Feature) =>
      props.kind === kind && (props.bridge === 1) === bridges; // prettier-ignore
    const edgeOf = (kind: RoadKind) => {
      if (bridges) return MAP.bridgeEdge;
      return kind === 'trunk' || kind === 'motorway' ? MAP.trunkEdge : MAP.roadEdge;
    };
    const edges = ROAD_ORDER.map((kind) =>
      stroke('road', kind, edgeOf(kind), widened(ROAD_WIDTHS[kind]!, bridges ? 2.6 : 1.8), {
        filter: onLevel(kind),
        cap: bridges ? 'butt' : 'round',
      }),
    );
    const fills = ROAD_ORDER.map((kind) =>
      stroke('road', kind, roadFill(kind), ROAD_WIDTHS[kind]!, { filter: onLevel(kind) }),
    );
    return [...edges, ...fills];
  };

  return [
    ...GROUND.map(([kind, colour]) => fill('ground', kind, colour)),
    {
      dataLayer: 'water',
      symbolizer: new PolygonSymbolizer({
        fill: MAP.water,
        stroke: MAP.waterEdge,
        width: (zoom) => (zoom >= 13 ? 0.8 : 0),
      }),
    },
    stroke('stream', 'river', MAP.water, [[9, 0.8], [14, 3], [18, 14]]), // prettier-ignore
    stroke('stream', 'canal', MAP.water, [[10, 0.6], [14, 2.4], [18, 12]]), // prettier-ignore
    stroke('stream', 'stream', MAP.water, [[13, 0.6], [18, 5]]), // prettier-ignore
    fill('ground', 'pier', MAP.pier),
    {
      dataLayer: 'building',
      minzoom: 15,
      symbolizer: new PolygonSymbolizer({
        fill: MAP.building,
        stroke: MAP.buildingEdge,
        width: (zoom) => (zoom >= 16 ? 0.6 : 0),
      }),
    },
    stroke('road', 'ferry', MAP.waterEdge, [[9, 0.8], [14, 1.4]], { dash: [5, 4], cap: 'butt' }), // prettier-ignore
    stroke('road', 'path', MAP.path, [[14, 0.7], [18, 2.2]], { dash: [3, 3], cap: 'butt' }), // prettier-ignore
    stroke('road', 'rail', MAP.rail, [[10, 0.7], [14, 1.4], [18, 3]], { cap: 'butt' }), // prettier-ignore
    ...roads(false),
    ...roads(true),
  ];
}

function roadFill(kind: RoadKind): string {
  if (kind === 'trunk' || kind === 'motorway') return MAP.trunk;
  return kind === 'primary' || kind === 'secondary' ? MAP.roadMain : MAP.road;
}

function widened(stops: Stops, by: number): Stops {
  return stops.map(([zoom, width]) => [zoom!, width! + Math.min(by, 0.5 + width! * 0.5)]);
}
