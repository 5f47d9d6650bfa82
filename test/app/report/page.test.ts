import { describe, expect, test } from 'vitest';
import { reportPage, summaryChapters } from '../../../app/report/index.ts';
import { hours, sampleBuilding, sampleRun } from './sample.ts';

const building = sampleBuilding();
const page = (words: Parameters<typeof sampleRun>[0] = {}) =>
  reportPage(
    { simulation: sampleRun(words), building, version: '9.8.7', madeOn: '2026-01-02' },
    summaryChapters,
  );

/** Tags opened and not closed, or closed and not opened; HTML's void elements aside. */
function unbalanced(html: string): string[] {
  const open: string[] = [];
  const wrong: string[] = [];
  const body = html.replace(/<!doctype html>/, '').replace(/<style>[\s\S]*?<\/style>/g, '');
  for (const [, slash, name = '', rest = ''] of body.matchAll(/<(\/?)([a-zA-Z0-9]+)([^>]*)>/g)) {
    if (slash) {
      if (open.pop() !== name) wrong.push(`</${name}>`);
    } else if (!rest.endsWith('/') && name !== 'meta') open.push(name);
  }
  return [...wrong, ...open];
}

describe('the summary page', () => {
  const html = page();

  test('names every room, in its table', () => {
    for (const name of ['Sun room', 'Larder', 'Building']) {
      expect(html).toContain(`<th scope="row">${name}</th>`);
    }
  });

  test('has every chapter once, under its own id', () => {
    const ids = [...html.matchAll(/<section id="([^"]+)">/g)].map(([, id]) => id);
    expect(ids).toEqual([
      'answers',
      'rooms',
      'worst-week',
      'months',
      'year',
      'load',
      'balance',
      'cautions',
      'assumptions',
      'weather',
      'methods',
      'quality',
    ]);
    const all = [...html.matchAll(/\sid="([^"]+)"/g)].map(([, id]) => id);
    expect(new Set(all).size).toBe(all.length);
    for (const [, id] of html.matchAll(/(?:href="|url\()#([^")]+)/g)) expect(all).toContain(id);
  });

  test('is the same for the same input, to the last byte', () => {
    expect(page()).toBe(html);
  });

  test('asks for nothing: no script, no picture, no address', () => {
    expect(html).not.toMatch(/<script|<img|<link|<iframe|javascript:|https?:/i);
    expect([...html.matchAll(/(?:href|src)\s*=\s*"([^"]*)"/g)].map(([, to]) => to)).toEqual([
      '#cautions',
    ]);
  });

  test('closes every tag it opens, and holds no figure that is none', () => {
    expect(unbalanced(html)).toEqual([]);
    expect(html).not.toMatch(/NaN|undefined|Infinity|\[object/);
  });

  test('says the version, the day, the repairs, the assumptions and the residual', () => {
    for (const words of [
      'Inglenook 9.8.7',
      '2026-01-02',
      'Filled 2 hours of wind.',
      'The ground is dry.',
      '3.4 × 10<sup>\u221213</sup>',
    ]) {
      expect(html).toContain(words);
    }
  });

  test('names a danger beside the answers, and defers to local codes', () => {
    const answers = html.slice(html.indexOf('id="answers"'), html.indexOf('id="rooms"'));
    expect(answers).toContain('One caution');
    expect(html).toContain('local codes and licensed practice');
  });

  test('the hours above in the picture of the months add up to those of the rooms', () => {
    const months = html.slice(html.indexOf('id="months"'), html.indexOf('id="year"'));
    const hung = [...months.matchAll(/>([\d,]+) h</g)].map(([, n]) => Number(n?.replace(',', '')));
    const rooms = sampleRun().rooms;
    let expected = 0;
    for (const room of rooms)
      for (let h = 0; h < hours; h++)
        if (room.occupied[h] && room.operativeC[h] > room.bandHighC[h]) expected++;
    expect(expected).toBeGreaterThan(100);
    expect(hung.reduce((a, b) => a + b, 0)).toBe(expected);
  });
});

test.each([
  ['a project', 'project'],
  ['a room', 'room'],
  ['a caution', 'caution'],
  ['a repair', 'repair'],
] as const)('%s cannot bring markup into the page', (_, place) => {
  const html = page({ [place]: '"><script>alert(1)</script>&amp;\u0000' });
  expect(html).not.toContain('<script>');
  expect(html).not.toContain('\u0000');
  expect(html).toContain('&quot;&gt;&lt;script&gt;alert(1)');
  expect(unbalanced(html)).toEqual([]);
});

test('a font is carried in the page, and cannot break out of its rule', () => {
  const input = { simulation: sampleRun(), building, version: '1', madeOn: '2026-01-02' };
  const html = reportPage(input, [], [{ weight: 400, woff2Base64: 'AAAA) } </style><b>' }]);
  expect(html).toContain('base64,AAAA');
  expect(html.split('</style>')).toHaveLength(2);
});
