import { booleanPointInPolygon } from '@turf/boolean-point-in-polygon';
import type { Position } from 'geojson';
import { assembleRings } from './assembleRings.ts';
import { chainNamedRoads, type NamedPiece } from './chainNamedRoads.ts';
import type { MapFeature } from './cutTiles.ts';
import { featureKind, labelKind, lineKind, polygonKind } from './featureKind.ts';
import { LAYER_ZOOMS } from './layers.ts';
import type { CollectedOsm } from './osm/collectOsm.ts';
import { E7, type NodeStore } from './osm/NodeStore.ts';
import type { OsmRelation, OsmTags } from './osm/osmTypes.ts';
import { ringCentre } from './ringCentre.ts';

/** Everything of an extract that is painted, and how many shapes had to be left out. */
export function mapFeatures(osm: CollectedOsm): { features: MapFeature[]; brokenShapes: number } {
  const features: MapFeature[] = [];
  const named: NamedPiece[] = [];
  for (const { lat, lon, tags } of osm.taggedNodes) addPoint(features, tags!, [lon, lat]);
  for (const { refs, tags } of osm.ways.values()) {
    if (tags) addWay(features, named, osm.nodes, refs, tags);
  }
  let brokenShapes = 0;
  for (const relation of osm.multipolygons) {
    if (!addMultipolygon(features, osm, relation)) brokenShapes += 1;
  }
  for (const { name, kind, refs } of chainNamedRoads(named)) {
    const coordinates = positions(osm.nodes, refs);
    if (coordinates.length < 2) continue;
    const geometry = { type: 'LineString', coordinates } as const;
    features.push({ ...featureKind('roadname', kind), geometry, tags: { name } });
  }
  return { features, brokenShapes };
}

function addPoint(features: MapFeature[], tags: OsmTags, at: Position) {
  const geometry = { type: 'Point', coordinates: at } as const;
  const label = labelKind(tags);
  if (label) features.push({ ...label, geometry, tags: { name: tags.name! } });
  const number = tags['addr:housenumber'];
  if (number) features.push({ ...featureKind('housenumber', 'house'), geometry, tags: { number } });
}

function addWay(
  features: MapFeature[],
  named: NamedPiece[],
  nodes: NodeStore,
  refs: number[],
  tags: OsmTags,
) {
  const line = lineKind(tags);
  const polygon = refs[0] === refs.at(-1) && refs.length > 3 ? polygonKind(tags) : null;
  if (!line && !polygon) return;
  const coordinates = positions(nodes, refs);
  if (coordinates.length < 2) return;
  if (line) {
    const marks = roadMarks(tags);
    features.push({ ...line, geometry: { type: 'LineString', coordinates }, tags: marks });
    if (tags.name && line.layer === 'road' && line.kind in LAYER_ZOOMS.roadname)
      named.push({ name: tags.name, kind: line.kind, refs });
    const bridge = tags['bridge:name'];
    if (bridge)
      features.push({
        ...featureKind('label', 'bridge'),
        geometry: { type: 'Point', coordinates: coordinates[coordinates.length >> 1]! },
        tags: { name: bridge },
      });
  } else if (polygon && coordinates.length > 3) {
    features.push({
      ...polygon,
      geometry: { type: 'Polygon', coordinates: [coordinates] },
      tags: {},
    });
    addPoint(features, tags, ringCentre(coordinates));
  }
}

function roadMarks(tags: OsmTags): Record<string, number> {
  const marks: Record<string, number> = {};
  if ((tags.bridge ?? 'no') !== 'no') marks.bridge = 1;
  if ((tags.tunnel ?? 'no') !== 'no') marks.tunnel = 1;
  if (tags.oneway === 'yes' && tags.junction === undefined) marks.oneway = 1;
  return marks;
}

function addMultipolygon(features: MapFeature[], osm: CollectedOsm, relation: OsmRelation) {
  const kind = polygonKind(relation.tags!);
  if (!kind) return true;
  const rings = (role: string) =>
    assembleRings(
      relation.members
        .filter((member) => member.type === 'way' && (member.role || 'outer') === role)
        .map((member) => osm.ways.get(member.ref)?.refs ?? []),
    )
      .map((ring) => positions(osm.nodes, ring))
      .filter((ring) => ring.length > 3);
  const outers = rings('outer').map((outer) => [outer]);
  if (outers.length === 0) return false;
  for (const inner of rings('inner')) holder(outers, inner)?.push(inner);
  const geometry = { type: 'MultiPolygon', coordinates: outers } as const;
  features.push({ ...kind, geometry, tags: {} });
  addPoint(features, relation.tags!, ringCentre(outers[0]![0]!));
  return true;
}

/** The outer ring an island or clearing lies in. */
function holder(polygons: Position[][][], inner: Position[]): Position[][] | undefined {
  if (polygons.length === 1) return polygons[0];
  return polygons.find(([outer]) =>
    booleanPointInPolygon(inner[0]!, { type: 'Polygon', coordinates: [outer!] }),
  );
}

function positions(nodes: NodeStore, refs: readonly number[]): Position[] {
  return refs.flatMap((ref) => {
    const index = nodes.indexOf(ref);
    return index < 0 ? [] : [[nodes.lonE7(index) / E7, nodes.latE7(index) / E7]];
  });
}
