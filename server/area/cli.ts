import { mkdir } from 'node:fs/promises';
import { basename, join } from 'node:path';
import { parseArgs } from 'node:util';
import { AreaImportError } from '#tiles/AreaImportError.ts';
import type { AreaMeta } from '#tiles/AreaMeta.ts';
import { importArea, type ImportProgress } from '#tiles/importArea.ts';
import { writeTown } from '#tiles/town/writeTown.ts';
import { areaFor } from './openAreas.ts';
import { dataFolder } from './dataFolder.ts';
import { DEMO_AREA, importDemoArea } from './importDemoArea.ts';

const USAGE = `npm run area -- COMMAND
  import FILE --name NAME [--credit TEXT]   make an area of an .osm.pbf or .osm extract
  town [FILE]                               import the demo town (or only write it to FILE)
  list NAME                                 what an imported area holds
  route --name NAME LAT,LON LAT,LON         seconds, metres and line as JSON
  table --name NAME LAT,LON LAT,LON …       seconds and metres matrices as JSON
  find  --name NAME TEXT [--near LAT,LON]   ranked addresses as JSON`;

/** A mistake in the command line; shown without a stack. */
class UsageError extends Error {}

let shown = -1;

try {
  await run(process.argv.slice(2));
} catch (failure) {
  if (!(failure instanceof UsageError) && !(failure instanceof AreaImportError)) throw failure;
  console.error(failure.message);
  process.exitCode = 1;
}

async function run(args: string[]): Promise<void> {
  const { values, positionals } = parseArgs({
    // A southern or western coordinate begins with a minus and is no option.
    args: args.map((arg) => (/^-\d/.test(arg) ? ` ${arg}` : arg)),
    allowPositionals: true,
    options: {
      name: { type: 'string' },
      credit: { type: 'string' },
      near: { type: 'string' },
    },
  });
  const [command, ...rest] = positionals.map((text) => text.trim());
  const name = values.name ?? DEMO_AREA;
  switch (command) {
    case 'import':
      return importFile(rest[0], values.name, values.credit);
    case 'town':
      return town(rest[0]);
    case 'list':
      return print(describe(rest[0] ?? name));
    case 'route': {
      const [from, to] = placesOf(rest, 2, 2);
      return print(openNamed(name).route(from!, to!));
    }
    case 'table':
      return printTable(name, rest);
    case 'find': {
      const near = values.near ? placeOf(values.near) : undefined;
      return print(openNamed(name).findAddresses(rest.join(' '), near));
    }
    default:
      throw new UsageError(USAGE);
  }
}

async function importFile(
  file: string | undefined,
  name: string | undefined,
  attribution: string | undefined,
): Promise<void> {
  if (!file || !name) throw new UsageError(`import needs a file and --name.\n${USAGE}`);
  await mkdir(join(dataFolder(), 'areas'), { recursive: true });
  report(
    await importArea({
      file,
      name,
      outDir: join(dataFolder(), 'areas', name),
      onProgress: showProgress,
      ...(attribution && { attribution }),
    }),
  );
}

async function town(file: string | undefined): Promise<void> {
  if (file) {
    const { nodes, ways, relations } = writeTown(file);
    console.log(`${basename(file)}: ${nodes} nodes, ${ways} ways, ${relations} relations`);
    return;
  }
  report(await importDemoArea(dataFolder(), showProgress));
}

function openNamed(name: string) {
  const area = areaFor(name);
  if (!area) throw new UsageError(`There is no area "${name}" in ${join(dataFolder(), 'areas')}.`);
  return area;
}

function describe(name: string) {
  const { version, bounds, attribution, addressCount } = openNamed(name);
  return { name, version, bounds, attribution, addressCount };
}

/** Matrices rather than one long row: easier to read and to check against other tools. */
function printTable(name: string, texts: string[]) {
  const places = placesOf(texts, 2, 200);
  const { seconds, metres, rough } = openNamed(name).table(places);
  const rows = <T>(flat: T[]) =>
    places.map((_, i) => flat.slice(i * places.length, (i + 1) * places.length));
  print({ seconds: rows(seconds), metres: rows(metres), rough: rows(rough) });
}

function placesOf(texts: string[], least: number, most: number) {
  if (texts.length < least || texts.length > most)
    throw new UsageError(
      `Give ${least === most ? least : `${least} to ${most}`} places as LAT,LON.`,
    );
  return texts.map(placeOf);
}

function placeOf(text: string) {
  const [lat, lon] = text.split(',').map(Number);
  const fine =
    lat !== undefined && lon !== undefined && Math.abs(lat) <= 90 && Math.abs(lon) <= 180;
  if (!fine) throw new UsageError(`"${text}" is no place; LAT,LON is right, e.g. 41.003,-36.001.`);
  return { lat, lon };
}

function print(value: unknown): void {
  console.log(JSON.stringify(value));
}

function showProgress({ step, permille }: ImportProgress): void {
  const percent = Math.floor(permille / 10);
  if (percent === shown) return;
  shown = percent;
  process.stderr.write(`\r${String(percent).padStart(3)} % ${step.padEnd(10)}`);
  if (step === 'done') process.stderr.write('\n');
}

function report({ name, version, counts }: AreaMeta): void {
  console.log(`${name} ${version}`);
  console.log(`  ${counts.junctions} junctions, ${counts.sections} road sections`);
  console.log(`  ${counts.droppedParts} road islands left out (${counts.droppedNodes} junctions)`);
  console.log(`  ${counts.addresses} addresses on ${counts.streets} streets`);
  console.log(`  ${counts.addressesWithoutStreet} house numbers without a street`);
  console.log(`  ${counts.tiles} map tiles, ${Math.round(counts.tileBytes / 1024)} kB`);
  if (counts.coastlines > 0)
    console.log(`  ${counts.coastlines} coastlines are not closed into sea`);
}
