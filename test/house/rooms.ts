// Who may import whom. A room is a folder of the map; another room is entered by its index.ts only, and
// inside one the file itself is imported. Data flows weather → engine → app and never back.

import { posix } from 'node:path';
import type { Source } from './sources.ts';

interface Rule {
  readonly rooms: readonly string[];
  readonly packages: readonly string[];
}

const ui = ['react', 'react-dom', 'zustand', 'chart.js', '@fontsource/ibm-plex-sans'];
const underEngine = ['weather', 'engine/physics', 'engine/network', 'engine/building'];

/** For each room: the other rooms and the packages it may import. "node:" stands for all of Node. */
export const rules: Readonly<Record<string, Rule>> = {
  weather: { rooms: [], packages: ['papaparse', 'luxon'] },
  'engine/physics': { rooms: ['weather'], packages: [] },
  'engine/network': { rooms: [], packages: ['ml-matrix'] },
  'engine/building': { rooms: ['weather', 'engine/physics'], packages: ['zod'] },
  'engine/assembly': { rooms: underEngine, packages: ['ml-matrix'] },
  'engine/findings': { rooms: [...underEngine, 'engine/assembly'], packages: [] },
  'engine/nodal': { rooms: ['weather', 'engine/network', 'engine/building'], packages: ['zod'] },
  'engine/study': {
    rooms: [...underEngine, 'engine/assembly', 'engine/findings', 'engine'],
    packages: ['zod'],
  },
  engine: {
    rooms: [...underEngine, 'engine/assembly', 'engine/findings', 'engine/nodal', 'engine/study'],
    packages: [],
  },
  'app/bridge': { rooms: [], packages: ['zod'] },
  'app/project': { rooms: ['engine', 'weather'], packages: [] },
  'app/disk': { rooms: ['weather'], packages: ['node:'] },
  'app/run': { rooms: ['engine', 'weather', 'app/project'], packages: ['node:', 'zod'] },
  'app/report': { rooms: ['engine', 'weather', 'app/run', 'app/project'], packages: ['node:'] },
  'app/cli': {
    rooms: ['engine', 'weather', 'app/run', 'app/project', 'app/disk', 'app/report', 'app'],
    packages: ['node:'],
  },
  'app/host': {
    rooms: ['app/bridge', 'app/disk', 'weather', 'app'],
    packages: ['node:', 'electron', 'zod'],
  },
  'app/ui': {
    rooms: ['engine', 'weather', 'app/bridge', 'app/project', 'app/run', 'app/report'],
    packages: ui,
  },
  /** Files that lie in app/ itself: facts that every room of it may know. */
  app: { rooms: [], packages: [] },
};

/** Rooms of rooms: only the files that lie in them directly are theirs. */
const shells = new Set(['engine', 'app']);

/** The innermost room of the map that holds a path, or null. */
export function roomOf(path: string): string | null {
  const parts = path.split('/');
  for (let length = parts.length - 1; length > 0; length--) {
    const folder = parts.slice(0, length).join('/');
    const isOwn = !shells.has(folder) || length === parts.length - 1;
    if (isOwn && Object.hasOwn(rules, folder)) return folder;
  }
  return null;
}

/** What a file imports: import and export … from, import(), and the address of a worker. */
export function importsOf(text: string): readonly string[] {
  const code = text.replace(/\/\*[\s\S]*?\*\//g, '').replace(/^\s*\/\/.*$/gm, '');
  const forms = [
    /^(?:import|export)\b[^;'"`]*?\bfrom\s*['"]([^'"]+)['"]/gm,
    /^import\s*['"]([^'"]+)['"]/gm,
    /\bimport\(\s*['"]([^'"]+)['"]/g,
    /\bnew URL\(\s*['"]([^'"]+\.tsx?)['"]\s*,\s*import\.meta\.url/g,
  ];
  return forms.flatMap((form) => [...code.matchAll(form)].map((match) => match[1] ?? ''));
}

const packageOf = (specifier: string) =>
  specifier.startsWith('node:')
    ? 'node:'
    : specifier
        .split('/')
        .slice(0, specifier.startsWith('@') ? 2 : 1)
        .join('/');

/** Addresses of a worker's file: the bundler takes them from the file itself, not through a front door. */
const workerEntry = /^app\/run\/worker\.browser\.ts$/;

/** Every import of a file that the map does not allow, as a sentence. */
export function breaches({ path, text }: Source): readonly string[] {
  const room = roomOf(path);
  const rule = room === null ? undefined : rules[room];
  if (room === null || rule === undefined) return [`${path} lies in no room of the map.`];
  return importsOf(text).flatMap((specifier) => {
    if (!specifier.startsWith('.')) {
      const name = packageOf(specifier);
      return rule.packages.includes(name) ? [] : [`${path}: ${room} may not use ${name}.`];
    }
    const target = posix.join(posix.dirname(path), specifier.replace(/\?.*$/, ''));
    if (target === 'package.json') return [];
    const other = roomOf(target);
    if (other === room) return [];
    if (other === null) return [`${path} imports ${target}, which lies in no room of the map.`];
    if (!rule.rooms.includes(other)) return [`${path}: ${room} may not import ${other}.`];
    // Through engine/index.ts, which opens the study too, the study would import itself.
    const isStudyRun = room === 'engine/study' && target === 'engine/simulate.ts';
    const isDoor =
      target === `${other}/index.ts` || other === 'app' || workerEntry.test(target) || isStudyRun;
    return isDoor ? [] : [`${path} enters ${other} by ${target}, not by its index.ts.`];
  });
}
