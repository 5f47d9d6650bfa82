// A project file that is wrong is turned away with every fault named: where, what was found, what is
// expected, how to mend it. The expectations are the format's own rules; no outside source.
import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { parseProject, parseProjectDocument } from '../../../engine/building/index.ts';
import { faultText } from '../../../weather/index.ts';

const demoText = readFileSync('demo/quillon-house.inglenook.json', 'utf8');

type Json = ReturnType<typeof JSON.parse>;

/** The demo with one thing changed, as the messages it draws. */
function messagesAfter(change: (document: Json) => void): string[] {
  const document: Json = JSON.parse(demoText);
  change(document);
  const parsed = parseProjectDocument(document, 'house.json');
  return parsed.ok ? [] : parsed.faults.map(faultText);
}

test('the demo house is read with its defaults filled in', () => {
  const parsed = parseProject(demoText, 'quillon-house.inglenook.json');
  expect(parsed.ok ? [] : parsed.faults.map(faultText)).toEqual([]);
  if (!parsed.ok) return;
  expect(parsed.value.rooms.map((room) => room.id)).toEqual([
    'living',
    'kitchen',
    'bedroom-1',
    'study',
    'bedroom-2',
  ]);
  expect(parsed.value.physics.insideConvection).toBe('walton');
});

test.each([
  ['an empty file', '', 'found an empty file'],
  ['a blank file', ' \n ', 'found an empty file'],
  ['binary data', 'PK\u0003\u0004\u0000\u0000', 'found binary data'],
  ['a file that was cut off', demoText.slice(0, 900), 'not JSON'],
  ['a list', '[1]', 'JSON that is no object'],
  [
    'another format',
    '{"format":"drawing"}',
    'format: found "drawing", expected "inglenook-project"',
  ],
  ['a later version', '{"format":"inglenook-project","version":7}', 'version: found 7, expected 1'],
])('%s is refused in one line', (_, text, message) => {
  const parsed = parseProject(text, 'house.json');
  expect(parsed.ok).toBe(false);
  if (parsed.ok) return;
  expect(parsed.faults).toHaveLength(1);
  expect(faultText(parsed.faults[0])).toContain(message);
});

test('a mistake in the JSON is placed by line and column', () => {
  const parsed = parseProject(
    '{\n  "format": "inglenook-project",\n  "version" 1\n}',
    'house.json',
  );
  expect(parsed.ok ? '' : faultText(parsed.faults[0])).toMatch(/line 3, column 1\d/);
});

test('an unknown field is named, not ignored', () => {
  expect(
    messagesAfter((d) => {
      d.rooms[0].surfaces[0].area = 3;
    }),
  ).toEqual([expect.stringContaining('rooms[0].surfaces[0].area: found the unknown field "area"')]);
});

test.each([0, -0.1])('a thickness of %s is refused with its place', (thickness) => {
  const [message, ...rest] = messagesAfter((d) => {
    d.constructions[0].layers[1].thicknessM = thickness;
  });
  expect(rest).toEqual([]);
  expect(message).toContain('constructions[0].layers[1].thicknessM');
  expect(message).toContain('more than 0');
});

test('openings larger than their wall are refused', () => {
  const messages = messagesAfter((d) => {
    d.rooms[0].surfaces[0].openings[0].areaM2 = 30;
    d.rooms[0].surfaces[0].openings[0].rectangle = { leftM: 0, bottomM: 0, widthM: 15, heightM: 2 };
  });
  expect(messages.join('\n')).toMatch(
    /surfaces\[0\]\.openings: found openings of 33.* m² together, expected at most the surface's 26 m²/,
  );
});

test('references that lead nowhere are named with the nearest id', () => {
  expect(
    messagesAfter((d) => {
      d.rooms[1].surfaces[0].construction = 'outer-wal';
    })[0],
  ).toContain('Did you mean "outer-wall"?');
  expect(
    messagesAfter((d) => {
      d.rooms[0].surfaces[3].boundary.room = 'cellar';
    }).join(),
  ).toContain('"cellar", expected the id of a room');
});

test('a partition that the other room does not know of is refused', () => {
  const messages = messagesAfter((d) => {
    d.rooms[1].surfaces.splice(3, 1);
  });
  expect(messages.join()).toContain('A partition has a face in both rooms');
});

test('a room whose surfaces have no area is refused', () => {
  expect(
    messagesAfter((d) => {
      d.rooms[0].surfaces = [];
    })[0],
  ).toContain('rooms[0].surfaces: found [], expected at least 1 entries');
  expect(
    messagesAfter((d) => {
      d.rooms[0].surfaces[1].areaM2 = 0;
    })[0],
  ).toContain('rooms[0].surfaces[1].areaM2: found 0');
});

test('several faults are listed together', () => {
  const messages = messagesAfter((d) => {
    d.rooms[0].floorAreaM2 = -1;
    d.materials[0].conductivityWPerMK = 'high';
    d.glazings[0].panes[0].solarTransmittance = 1.2;
  });
  expect(messages).toHaveLength(3);
});

test('air that leaves a room without any coming in is refused', () => {
  const messages = messagesAfter((d) => {
    d.airPaths = [{ from: 'living', to: 'kitchen', flowM3PerS: 0.02 }];
  });
  expect(messages.join()).toContain('as much air out of each room as into it');
});

test('what a pane lets through and throws back cannot exceed what comes in', () => {
  const messages = messagesAfter((d) => {
    d.glazings[0].panes[1].frontSolarReflectance = 0.5;
  });
  expect(messages[0]).toContain('a sum of at most 1');
});
