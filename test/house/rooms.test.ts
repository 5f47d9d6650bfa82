import { describe, expect, test } from 'vitest';
import { breaches, importsOf, roomOf } from './rooms.ts';
import { sourcesOf } from './sources.ts';

test('every import in weather, engine and app keeps to the map', () => {
  const sources = sourcesOf('weather', 'engine', 'app');
  expect(sources.length).toBeGreaterThan(50);
  expect(sources.flatMap(breaches)).toEqual([]);
});

describe('the reading of imports', () => {
  test('finds every form, on one line or several, and none in comments', () => {
    const text = `
// import { a } from './comment.ts';
/* import './block.ts'; */
import { b } from './b.ts';
import type { C } from "./c.ts";
import {
  d,
  e,
} from './d.ts';
import './style.css';
export * from './f.ts';
export { type G, h } from './g.ts';
const lazy = await import('./lazy.ts');
new Worker(new URL('./worker.ts', import.meta.url), { type: 'module' });
const words = "taken from 'here'";
`;
    expect([...importsOf(text)].sort()).toEqual([
      './b.ts',
      './c.ts',
      './d.ts',
      './f.ts',
      './g.ts',
      './lazy.ts',
      './style.css',
      './worker.ts',
    ]);
  });

  test('a file belongs to its innermost room', () => {
    expect(roomOf('engine/physics/films.ts')).toBe('engine/physics');
    expect(roomOf('engine/index.ts')).toBe('engine');
    expect(roomOf('weather/sun/position.ts')).toBe('weather');
    expect(roomOf('app/host/electron/main.ts')).toBe('app/host');
    expect(roomOf('elsewhere/a.ts')).toBe(null);
  });
});

// A check that finds nothing proves nothing: each kind of breach is shown to be found.
test.each([
  ['weather/a.ts', "import { x } from '../engine/index.ts';", 'weather may not import engine'],
  [
    'engine/network/a.ts',
    "import { x } from '../building/index.ts';",
    'may not import engine/building',
  ],
  ['engine/physics/a.ts', "import { z } from 'zod';", 'engine/physics may not use zod'],
  ['engine/building/a.ts', "import { readFile } from 'node:fs';", 'may not use node:'],
  ['app/ui/a.tsx', "import { x } from '../host/index.ts';", 'app/ui may not import app/host'],
  ['app/ui/a.tsx', "import fs from 'node:fs';", 'app/ui may not use node:'],
  ['app/host/a.ts', "import { x } from '../../engine/index.ts';", 'app/host may not import engine'],
  [
    'app/cli/a.ts',
    "import { x } from '../../engine/network/index.ts';",
    'may not import engine/network',
  ],
  ['app/cli/a.ts', "import { x } from '../disk/read-text.ts';", 'not by its index.ts'],
  ['app/run/a.ts', "export * from '../../weather/sun/position.ts';", 'not by its index.ts'],
  ['app/new/a.ts', '', 'lies in no room'],
])('%s with %s is found', (path, text, message) => {
  expect(breaches({ path, text }).join()).toContain(message);
});
