import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  beginStory,
  boundaryEdit,
  type Edit,
  emptyProject,
  layersEdit,
  openingSizeEdit,
  type ProjectForm,
  removeRoom,
  rowsOfText,
  surfaceEdit,
  surfaceRowsEdit,
  swapEdit,
  tell,
  textOfRows,
} from '../../../app/project/index.ts';
import { parseProjectDocument } from '../../../engine/index.ts';

/** Two rooms side by side, with a partition between them, as a project in tables. */
function twoRooms(): ProjectForm {
  const start = emptyProject('House');
  const [room] = start.rooms;
  if (!room) throw new Error('no room');
  const { box: _, ...plain } = room;
  const { plan: __, ...rest } = start;
  return {
    ...rest,
    rooms: [
      { ...plain, id: 'a', name: 'A' },
      { ...plain, id: 'b', name: 'B' },
    ],
  };
}

function made(form: ProjectForm, edit: Edit | null): ProjectForm {
  if (!edit) throw new Error('no edit');
  const told = tell(beginStory(JSON.parse(JSON.stringify(form))), edit);
  if (!told.ok) throw new Error(told.why);
  return told.story.now.document as unknown as ProjectForm;
}
function faults(form: ProjectForm): string[] {
  const parsed = parseProjectDocument(JSON.parse(JSON.stringify(form)), 'house');
  return parsed.ok
    ? []
    : parsed.faults.map(({ place, found }) => `${JSON.stringify(place)} ${found}`);
}
const surfaceOf = (form: ProjectForm, room: string, surface: string) => {
  const owner = form.rooms.find(({ id }) => id === room);
  const found = owner?.surfaces.find(({ id }) => id === surface);
  if (!owner || !found) throw new Error(`no ${room}/${surface}`);
  return { owner, found };
};
const built = (form: ProjectForm) => {
  const parsed = parseProjectDocument(JSON.parse(JSON.stringify(form)), 'house');
  if (!parsed.ok) throw new Error('not sound');
  return parsed.value;
};

describe('a partition made in the tables', () => {
  const start = twoRooms();
  const { owner, found } = surfaceOf(start, 'a', 'right');
  const joined = made(start, boundaryEdit(start, owner, found, 'room:b'));

  test('gives the neighbour its other face, and the project stays sound', () => {
    const other = surfaceOf(joined, 'b', 'right-a').found;
    expect(other).toMatchObject({ areaM2: found.areaM2, azimuthDeg: 270, reversed: true });
    expect(faults(joined)).toEqual([]);
  });

  test('changes both faces when one is changed', () => {
    const face = surfaceOf(joined, 'b', 'right-a');
    let next = made(joined, surfaceEdit(joined, face.owner, face.found, 'areaM2', 7.5, 'x'));
    const again = surfaceOf(next, 'b', 'right-a');
    next = made(
      next,
      surfaceEdit(next, again.owner, again.found, 'construction', 'wall-cross-laminated', 'x'),
    );
    expect(surfaceOf(next, 'a', 'right').found).toMatchObject({
      areaM2: 7.5,
      construction: 'wall-cross-laminated',
    });
    expect(faults(next)).toEqual([]);
  });

  test('looks outdoors again when its neighbour is removed', () => {
    const b = joined.rooms.find(({ id }) => id === 'b');
    if (!b) throw new Error('no b');
    const next = made(joined, removeRoom(joined, b));
    expect(surfaceOf(next, 'a', 'right').found.boundary).toEqual({ kind: 'outdoors' });
    expect(faults(next)).toEqual([]);
  });
});

describe('fabric of the library', () => {
  const form = emptyProject('House');
  const building = built(form);
  const construction = building.constructions.find(({ id }) => id === 'wall-render-eps-160');
  if (!construction) throw new Error('no wall');
  const own = { form, building, construction };

  test('is copied into the project with its materials before a layer is changed', () => {
    const [first, ...others] = construction.layers;
    if (!first || !('material' in first)) throw new Error('no layer');
    const next = made(form, layersEdit(own, [{ ...first, thicknessM: 0.03 }, ...others], 'x'));
    expect(next.constructions?.[0]?.layers[0]).toMatchObject({ thicknessM: 0.03 });
    expect(next.materials?.map(({ id }) => id)).toContain(first.material);
    expect(new Set(next.materials?.map(({ id }) => id)).size).toBe(next.materials?.length);
    expect(faults(next)).toEqual([]);
  });

  test('takes the place of other layers under the id that surfaces use', () => {
    const next = made(form, swapEdit(own, 'wall-timber-frame-240'));
    expect(next.constructions?.map(({ id }) => id)).toEqual([construction.id]);
    expect(next.constructions?.[0]?.name).toMatch(/timber/i);
    expect(faults(next)).toEqual([]);
  });
});

test('a window that is made wider has its area follow', () => {
  const form = emptyProject('House');
  const { owner, found } = surfaceOf(form, 'room', 'bottom');
  const [window] = found.openings ?? [];
  if (!window) throw new Error('no window');
  const next = made(form, openingSizeEdit(owner, found, window, { widthM: 2 }));
  expect(surfaceOf(next, 'room', 'bottom').found.openings?.[0]).toMatchObject({
    areaM2: 2 * 1.4,
    rectangle: { widthM: 2, heightM: 1.4 },
  });
  expect(faults(next)).toEqual([]);
});

describe('rows from a spreadsheet', () => {
  test('quotes, tabs and line ends as spreadsheets write them', () => {
    expect(rowsOfText('a\t"b ""c"""\t"d\ne"\r\n\t\n1,5\t2\t3\n')).toEqual([
      ['a', 'b "c"', 'd\ne'],
      ['1,5', '2', '3'],
    ]);
    expect(rowsOfText('a;1,5\nb;2')).toEqual([
      ['a', '1,5'],
      ['b', '2'],
    ]);
  });

  test('what is copied can be pasted: any words, in any cell', () => {
    const word = fc
      .string({ minLength: 1 })
      .map((text) => `x${text.replace(/[\r\s]/g, ' ').trim()}`);
    fc.assert(
      fc.property(
        fc.array(fc.array(word, { minLength: 2, maxLength: 2 }), { minLength: 1 }),
        (rows) => {
          expect(rowsOfText(textOfRows(rows, '.'))).toEqual(rows);
        },
      ),
    );
  });

  test('figures go out with the decimal sign of the user and without thousands', () => {
    expect(textOfRows([['1,234.5', '\u22120.7', 'Cavity wall, 50 mm']], ',')).toBe(
      '1234,5\t-0,7\tCavity wall, 50 mm',
    );
  });

  test('two hundred surfaces are taken at once; a name that is there is changed, not doubled', () => {
    const form = twoRooms();
    const [room] = form.rooms;
    if (!room) throw new Error('no room');
    const rows = Array.from({ length: 200 }, (_, i) => ({
      name: i === 0 ? 'North wall' : `Piece ${i}`,
      areaM2: 0.1,
      tiltDeg: 90,
      azimuthDeg: 180,
      construction: 'wall-render-eps-160',
    }));
    const next = made(form, surfaceRowsEdit(room, rows));
    expect(next.rooms[0]?.surfaces).toHaveLength(room.surfaces.length + 199);
    expect(faults(next)).toEqual([]);
  });
});
