import L from 'leaflet';
import { useEffect } from 'react';
import { useMap } from 'react-leaflet';
import { TILE_ZOOMS, tileAddress } from '#tiles/layers.ts';
import { labelRules } from './labelRules.ts';
import { MAP, MAP_FONT } from './mapColours.ts';
import { paintRules } from './paintRules.ts';

/** The painted ground of an area: vector tiles drawn with our own rules. */
export function GroundLayer({
  areaName,
  version,
  attribution,
}: {
  areaName: string;
  version: string;
  attribution: string;
}) {
  const map = useMap();
  useEffect(() => {
    let layer: L.Layer | undefined;
    let left = false;
    void loadProtomaps().then((protomaps) => {
      if (left) return;
      layer = protomaps.leafletLayer({
        url: tileAddress(areaName, version),
        maxDataZoom: TILE_ZOOMS.most,
        paintRules: paintRules(protomaps),
        labelRules: labelRules(protomaps),
        backgroundColor: MAP.paper,
        attribution: attributionMarkup(attribution),
        // Lettering measured before its font arrives would stay in the wrong place.
        tasks: [
          document.fonts.load(`500 12px ${MAP_FONT}`).then(
            () => DONE,
            () => DONE,
          ),
        ],
      }) as unknown as L.Layer;
      layer.addTo(map);
    });
    return () => {
      left = true;
      layer?.remove();
    };
  }, [map, areaName, version, attribution]);
  return null;
}

const DONE = { status: 'fulfilled', reason: new Error('none') };

/** The library reads a global `L`, so it can only be loaded once that is there. */
function loadProtomaps() {
  (globalThis as { L?: typeof L }).L = L;
  return import('protomaps-leaflet');
}

/** OpenStreetMap asks for a link to its copyright page; everything else stays plain text. */
function attributionMarkup(text: string): string {
  const safe = text.replace(/[&<>"]/g, (c) => `&#${c.charCodeAt(0)};`);
  return safe.replace(
    /©?\s*OpenStreetMap contributors/,
    '<a href="https://www.openstreetmap.org/copyright" rel="noreferrer" target="_blank">$&</a>',
  );
}
