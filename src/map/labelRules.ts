import type { Feature, LabelRule, LabelSymbolizer } from 'protomaps-leaflet';
import type * as Protomaps from 'protomaps-leaflet';
import { CurvedNames } from './CurvedNames.ts';
import { MAP, MAP_FONT } from './mapColours.ts';

type BySize = (zoom: number) => number;

const kindIn =
  (...kinds: string[]) =>
  (_zoom: number, feature: Feature) =>
    kinds.includes(feature.props.kind as string);

const between =
  (fromZoom: number, from: number, toZoom: number, to: number): BySize =>
  (zoom) =>
    from + (to - from) * Math.max(0, Math.min(1, (zoom - fromZoom) / (toZoom - fromZoom)));

/** What is lettered, the most important first: earlier labels keep their place. */
export function labelRules(protomaps: typeof Protomaps): LabelRule[] {
  const { CenteredTextSymbolizer } = protomaps;
  const text = (
    size: BySize,
    fill: string,
    weight: number,
    more: { italic?: boolean; spacing?: number; prop?: string } = {},
  ): LabelSymbolizer =>
    new CenteredTextSymbolizer({
      labelProps: [more.prop ?? 'name'],
      font: (zoom: number) =>
        `${more.italic ? 'italic ' : ''}${weight} ${size(zoom).toFixed(1)}px ${MAP_FONT}`,
      fill,
      stroke: MAP.paper,
      width: 2.6,
      lineHeight: 1.15,
      maxLineChars: 15,
      letterSpacing: more.spacing ?? 0,
    });
  const label = (
    kinds: string[],
    minzoom: number,
    maxzoom: number,
    symbolizer: LabelSymbolizer,
  ): LabelRule => ({ dataLayer: 'label', minzoom, maxzoom, filter: kindIn(...kinds), symbolizer });
  const streets = (kinds: string[], minzoom: number, size: BySize, weight: number): LabelRule => ({
    dataLayer: 'roadname',
    minzoom,
    filter: kindIn(...kinds),
    symbolizer: new CurvedNames({
      size,
      font: (zoom) => `${weight} ${size(zoom).toFixed(1)}px ${MAP_FONT}`,
      fill: MAP.streetText,
      halo: MAP.road,
    }),
  });

  return [
    label(['city', 'town'], 8, 13, text(between(9, 14, 13, 19), MAP.text, 650)),
    label(['village'], 10, 16, text(between(10, 11, 14, 14), MAP.text, 600)),
    label(['suburb'], 12, 15, text(between(12, 11, 15, 14), MAP.quietText, 600, { spacing: 0.6 })),
    label(['sea'], 9, 18, text(between(9, 12, 14, 17), MAP.waterText, 500, { italic: true, spacing: 1 })),
    label(['hamlet', 'place'], 12, 18, text(between(12, 10.5, 16, 12), MAP.quietText, 500)),
    streets(['motorway', 'trunk', 'primary'], 12, between(12, 10, 17, 13), 550),
    streets(['secondary', 'tertiary'], 13, between(13, 10, 17, 12.5), 500),
    label(['vet', 'clinic'], 14, 18, text(between(14, 10.5, 17, 12), MAP.text, 600)),
    label(['park', 'wood'], 13, 18, text(between(13, 10, 17, 12.5), MAP.greenText, 550)),
    label(['water'], 13, 18, text(between(13, 10, 17, 12.5), MAP.waterText, 500, { italic: true })),
    label(['bridge'], 14, 18, text(between(14, 10, 17, 12), MAP.streetText, 600)),
    streets(['street'], 14, between(14, 9.5, 17, 12), 450),
    label(['school'], 15, 18, text(between(15, 10, 17, 11.5), MAP.quietText, 500)),
    {
      dataLayer: 'housenumber',
      minzoom: 17,
      symbolizer: text(between(17, 9.5, 18, 11), MAP.quietText, 500, { prop: 'number' }),
    },
  ]; // prettier-ignore
}
