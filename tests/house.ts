import { readdirSync, readFileSync } from 'node:fs';
import { join, posix, relative, sep } from 'node:path';
import { parseSync, Visitor } from 'oxc-parser';

/** One import found in a file: what it asks for and on which line. */
export interface FoundImport {
  wanted: string;
  line: number;
}

/** Rooms a room may import from (itself always). Everything not listed is forbidden. */
export const mayImport: Record<string, string[]> = {
  'shared/stats': [],
  'shared/time': [],
  'shared/travel': ['shared/time'],
  'shared/forecast': ['shared/stats'],
  'shared/schedule': ['shared/forecast', 'shared/stats', 'shared/travel', 'shared/time'],
  'shared/optimiser': ['shared/schedule'],
  'shared/grooming': ['shared/stats'],
  'shared/texts': ['shared/time'],
  'shared/api': ['shared/*'],

  server: ['server/*', 'shared/*'],
  'server/errors.ts': ['shared/api'],
  'server/env.ts': ['server/readOrMakeFile.ts'],
  'server/readOrMakeFile.ts': [],
  'server/clock.ts': ['server/env.ts'],
  'server/log.ts': ['server/env.ts'],
  'server/http': ['server/services', 'shared/api'],
  'server/routes': ['server/http', 'server/services', 'server/presenters', 'shared/api'],
  'server/policies': ['server/models', 'shared/api'],
  'server/presenters': ['server/models', 'shared/*'],
  'server/services': [
    'server/models',
    'server/db',
    'server/policies',
    'server/optimiser',
    'server/area',
    'server/sms',
    'server/mail',
    'shared/!api',
  ],
  'server/models': ['server/db', 'shared/!api'],
  'server/db': [],
  'server/db/seed': ['server/services', 'server/models', 'server/db', 'server/area', 'shared/!api'],
  'server/area': ['tiles', 'shared/travel'],
  'server/optimiser': ['shared/optimiser', 'shared/schedule'],
  'server/jobs': ['server/services'],
  'server/sms': ['shared/texts'],
  'server/mail': ['shared/texts'],
  'server/setup': ['tiles'],

  'src/lib': [],
  'src/components': ['src/lib'],
  'src/api': ['src/lib', 'shared/*'],
  'src/offline': ['src/api', 'src/lib', 'shared/*'],
  'src/map': ['src/components', 'src/lib', 'shared/*', 'tiles/layers.ts'],
  'src/strips': ['src/components', 'src/lib', 'shared/*'],
  'src/features': [
    'src/map',
    'src/strips',
    'src/offline',
    'src/components',
    'src/api',
    'src/lib',
    'shared/!optimiser',
  ],
  'src/routes': [
    'src/features',
    'src/map',
    'src/strips',
    'src/offline',
    'src/components',
    'src/api',
    'src/lib',
    'shared/!optimiser',
  ],
  src: [
    'src/routes',
    'src/features',
    'src/components',
    'src/api',
    'src/offline',
    'src/lib',
    'shared/*',
  ],

  tiles: ['shared/travel'],
  tests: [
    'shared/*',
    'server/*',
    'server',
    'src/*',
    'src',
    'tiles',
    'server/errors.ts',
    'server/env.ts',
  ],
};

/** What every room of the server may lean on: they lean on nothing but each other. */
const groundFloor = [
  'server/errors.ts',
  'server/env.ts',
  'server/clock.ts',
  'server/log.ts',
  'server/readOrMakeFile.ts',
];

/** Reads one file's imports: static, exported-from, dynamic, and `new URL(…, import.meta.url)`. */
export function readImports(path: string, text: string): FoundImport[] {
  const { program, errors } = parseSync(path, text);
  if (errors.length > 0) throw new Error(`${path} cannot be read: ${errors[0]!.message}`);
  const found: FoundImport[] = [];
  const add = (value: unknown, start: number) => {
    if (typeof value === 'string')
      found.push({ wanted: value, line: text.slice(0, start).split('\n').length });
  };
  new Visitor({
    ImportDeclaration: (node) => add(node.source.value, node.start),
    ExportNamedDeclaration: (node) => add(node.source?.value, node.start),
    ExportAllDeclaration: (node) => add(node.source.value, node.start),
    ImportExpression: (node) => {
      if (node.source.type === 'Literal') add(node.source.value, node.start);
    },
    NewExpression: (node) => {
      const [first, second] = node.arguments;
      const isUrl = node.callee.type === 'Identifier' && node.callee.name === 'URL';
      if (
        isUrl &&
        first?.type === 'Literal' &&
        second &&
        text.slice(second.start, second.end) === 'import.meta.url'
      )
        add(
          typeof first.value === 'string' && /\.[cm]?[jt]sx?$/.test(first.value)
            ? first.value
            : null,
          node.start,
        );
    },
  }).visit(program);
  return found;
}

/** The repository path an import reaches, or null for a package. */
export function resolveImport(from: string, wanted: string): string | null {
  const alias = /^#(shared|server|src|tiles)\/(.*)$/.exec(wanted);
  if (alias) return `${alias[1]}/${alias[2]}`;
  if (wanted.startsWith('.')) return posix.normalize(posix.join(posix.dirname(from), wanted));
  return null;
}

/** The most specific room a path lies in. */
export function roomOf(path: string): string {
  if (mayImport[path]) return path;
  for (let folder = posix.dirname(path); folder !== '.'; folder = posix.dirname(folder))
    if (mayImport[folder]) return folder;
  return path.split('/')[0]!;
}

/** Says in words why an import is forbidden, or null when it is fine. */
export function judgeImport(from: string, target: string): string | null {
  if (target.startsWith('tests/') && !from.startsWith('tests/')) return 'nobody imports tests';
  const isTest = /\.test\.tsx?$/.test(from);
  const fromRoom = roomOf(from);
  const toRoom = roomOf(target);
  const fromFeature = /^src\/features\/([^/]+)\//.exec(from)?.[1];
  const toFeature = /^src\/features\/([^/]+)\//.exec(target)?.[1];
  if (fromFeature && toFeature)
    return fromFeature === toFeature ? null : 'no feature imports another';
  if (fromRoom === toRoom) return null;
  if (from.startsWith('server/') && groundFloor.includes(target)) return null;
  if (fromRoom === 'server/db/seed' && toRoom === 'server/db') return null;
  // Command-line doors tie rooms together like main.ts does.
  if (/^server\/(db|area)\/\w*[cC]li\.ts$/.test(from) && /^(server|shared|tiles)/.test(target))
    return null;
  const allowed = mayImport[fromRoom] ?? [];
  if (allowed.some((rule) => matches(rule, target, toRoom))) return null;
  if (isTest && fromRoom.startsWith('shared') && toRoom === 'shared/time') return null;
  return `${fromRoom} may import ${allowed.join(', ') || 'nothing outside itself'}`;
}

/** Every forbidden import below `root`, as lines for people. */
export function findForbidden(
  root: string,
  folders = ['shared', 'server', 'src', 'tiles', 'tests'],
): string[] {
  const complaints: string[] = [];
  for (const file of folders.flatMap((folder) => listFiles(join(root, folder)))) {
    const path = relative(root, file).split(sep).join('/');
    if (path.includes('/fixtures/')) continue;
    for (const { wanted, line } of readImports(path, readFileSync(file, 'utf8'))) {
      const target = resolveImport(path, wanted);
      const why = target === null ? judgePackage(path, wanted) : judgeImport(path, target);
      if (why) complaints.push(`${path}:${line} imports ${wanted}: ${why}`);
    }
  }
  return complaints;
}

/** Import circles inside one floor, each as the list of files that form it. */
export function findCircles(root: string, folders: string[]): string[][] {
  const edges = new Map<string, string[]>();
  for (const file of folders.flatMap((folder) => listFiles(join(root, folder)))) {
    const path = relative(root, file).split(sep).join('/');
    edges.set(
      path,
      readImports(path, readFileSync(file, 'utf8'))
        .map(({ wanted }) => resolveImport(path, wanted))
        .filter((target): target is string => target !== null),
    );
  }
  const circles: string[][] = [];
  const state = new Map<string, 'open' | 'closed'>();
  const walk = (path: string, trail: string[]) => {
    if (state.get(path) === 'closed') return;
    if (state.get(path) === 'open') {
      circles.push([...trail.slice(trail.indexOf(path)), path]);
      return;
    }
    state.set(path, 'open');
    for (const next of edges.get(path) ?? []) walk(next, [...trail, path]);
    state.set(path, 'closed');
  };
  for (const path of edges.keys()) walk(path, []);
  return circles;
}

function judgePackage(path: string, wanted: string): string | null {
  const pure = path.startsWith('shared/') && !path.endsWith('.test.ts');
  if (pure && /^node:|^(express|sequelize|mariadb|react|leaflet|twilio)\b/.test(wanted))
    return 'shared is pure: no I/O, no Node, no DOM';
  if (path.startsWith('src/') && !/\.test\.tsx?$/.test(path) && wanted.startsWith('node:'))
    return 'the browser has no Node';
  return null;
}

function matches(rule: string, target: string, room: string): boolean {
  if (rule === room || rule === target) return true;
  const negative = /^(.+)\/!(.+)$/.exec(rule);
  if (negative)
    return (
      target.startsWith(`${negative[1]}/`) && !target.startsWith(`${negative[1]}/${negative[2]}/`)
    );
  return rule.endsWith('/*') && target.startsWith(rule.slice(0, -1));
}

function listFiles(folder: string): string[] {
  let entries;
  try {
    entries = readdirSync(folder, { withFileTypes: true });
  } catch {
    return [];
  }
  return entries.flatMap((entry) => {
    const path = join(folder, entry.name);
    if (entry.isDirectory()) return entry.name === 'node_modules' ? [] : listFiles(path);
    return /\.(m?[jt]sx?)$/.test(entry.name) && !entry.name.endsWith('.d.mts') ? [path] : [];
  });
}
