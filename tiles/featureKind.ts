import { LAYER_ZOOMS, type LayerName } from './layers.ts';
import type { OsmTags } from './osm/osmTypes.ts';

/** Where a tagged thing is drawn and from which data zoom on. */
export interface FeatureKind {
  layer: LayerName;
  kind: string;
  least: number;
}

type Rule = readonly [key: string, values: readonly string[], kind: string];

/** First match wins, so what is drawn above stands first. */
const POLYGON_RULES: readonly (readonly [LayerName, Rule])[] = [
  ['water', ['natural', ['water', 'bay'], 'water']],
  ['water', ['waterway', ['riverbank', 'dock', 'basin'], 'water']],
  ['water', ['landuse', ['reservoir', 'basin'], 'water']],
  ['ground', ['man_made', ['pier', 'breakwater'], 'pier']],
  ['ground', ['natural', ['beach', 'sand', 'shoal'], 'sand']],
  ['ground', ['leisure', ['park', 'garden', 'nature_reserve', 'recreation_ground'], 'park']],
  ['ground', ['leisure', ['golf_course', 'common', 'dog_park'], 'park']],
  ['ground', ['leisure', ['pitch', 'track', 'playground', 'stadium'], 'pitch']],
  ['ground', ['landuse', ['forest'], 'wood']],
  ['ground', ['natural', ['wood', 'scrub', 'heath'], 'wood']],
  ['ground', ['landuse', ['recreation_ground', 'village_green', 'cemetery', 'allotments'], 'park']],
  ['ground', ['landuse', ['grass', 'meadow'], 'grass']],
  ['ground', ['natural', ['grassland', 'wetland', 'marsh'], 'grass']],
  ['ground', ['landuse', ['farmland', 'orchard', 'vineyard'], 'farm']],
  ['ground', ['amenity', ['school', 'hospital', 'university', 'college'], 'yard']],
  ['ground', ['landuse', ['industrial', 'railway', 'harbour', 'port', 'military'], 'yard']],
  ['ground', ['landuse', ['residential', 'commercial', 'retail'], 'built']],
];

const LINE_RULES: readonly (readonly [LayerName, Rule])[] = [
  ['road', ['highway', ['motorway', 'motorway_link'], 'motorway']],
  ['road', ['highway', ['trunk', 'trunk_link'], 'trunk']],
  ['road', ['highway', ['primary', 'primary_link'], 'primary']],
  ['road', ['highway', ['secondary', 'secondary_link'], 'secondary']],
  ['road', ['highway', ['tertiary', 'tertiary_link'], 'tertiary']],
  ['road', ['highway', ['unclassified', 'residential', 'living_street', 'road'], 'street']],
  ['road', ['highway', ['pedestrian'], 'street']],
  ['road', ['highway', ['service'], 'service']],
  ['road', ['highway', ['footway', 'path', 'cycleway', 'track', 'steps', 'bridleway'], 'path']],
  ['road', ['railway', ['rail', 'light_rail', 'narrow_gauge', 'tram'], 'rail']],
  ['road', ['route', ['ferry'], 'ferry']],
  ['stream', ['waterway', ['river'], 'river']],
  ['stream', ['waterway', ['canal'], 'canal']],
  ['stream', ['waterway', ['stream', 'ditch', 'drain'], 'stream']],
];

const LABEL_RULES: readonly Rule[] = [
  ['place', ['city'], 'city'],
  ['place', ['town'], 'town'],
  ['place', ['village'], 'village'],
  ['place', ['suburb', 'quarter', 'neighbourhood'], 'suburb'],
  ['place', ['hamlet', 'locality', 'island', 'islet'], 'hamlet'],
  ['place', ['sea', 'ocean'], 'sea'],
  ['natural', ['bay', 'strait'], 'sea'],
  ['natural', ['water'], 'water'],
  ['leisure', ['park', 'garden', 'golf_course', 'nature_reserve', 'dog_park'], 'park'],
  ['natural', ['wood'], 'wood'],
  ['landuse', ['forest'], 'wood'],
  ['landuse', ['cemetery', 'industrial', 'harbour', 'port'], 'place'],
  ['natural', ['beach', 'peak', 'cape'], 'place'],
  ['amenity', ['school', 'university', 'college'], 'school'],
  ['amenity', ['hospital'], 'clinic'],
  ['amenity', ['veterinary'], 'vet'],
];

/** The fill of a closed shape, or null when we paint nothing for it. */
export function polygonKind(tags: OsmTags): FeatureKind | null {
  return byRules(POLYGON_RULES, tags) ?? buildingKind(tags);
}

/** The stroke of an open or closed line, or null. */
export function lineKind(tags: OsmTags): FeatureKind | null {
  return byRules(LINE_RULES, tags);
}

/** The lettering of a named thing, or null for the nameless. */
export function labelKind(tags: OsmTags): FeatureKind | null {
  if (!tags.name) return null;
  const rule = LABEL_RULES.find((candidate) => fits(candidate, tags));
  return rule ? featureKind('label', rule[2]) : null;
}

/** A kind with the zoom `layers.ts` gives it. */
export function featureKind(layer: LayerName, kind: string): FeatureKind {
  const zooms: Record<string, number> = LAYER_ZOOMS[layer];
  return { layer, kind, least: zooms[kind]! };
}

function buildingKind(tags: OsmTags): FeatureKind | null {
  return tags.building && tags.building !== 'no' ? featureKind('building', 'building') : null;
}

function byRules(rules: typeof POLYGON_RULES, tags: OsmTags): FeatureKind | null {
  const found = rules.find(([, rule]) => fits(rule, tags));
  return found ? featureKind(found[0], found[1][2]) : null;
}

function fits([key, values]: Rule, tags: OsmTags): boolean {
  const value = tags[key];
  return value !== undefined && values.includes(value);
}
