import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  beginStory,
  differences,
  type Edit,
  emptyProject,
  endGesture,
  freeId,
  projectForm,
  projectText,
  redo,
  type Story,
  tell,
  undo,
} from '../../../app/project/index.ts';
import { parseProject } from '../../../engine/index.ts';

const start = {
  name: 'House',
  rooms: [
    { id: 'a', volumeM3: 50 },
    { id: 'b', volumeM3: 30 },
  ],
};

function told(story: Story, edit: Edit): Story {
  const result = tell(story, edit);
  if (!result.ok) throw new Error(result.why);
  return result.story;
}
const volume = (value: number, gesture?: string): Edit => ({
  name: `Volume ${value}`,
  changes: [{ path: 'rooms[a].volumeM3', value }],
  ...(gesture === undefined ? {} : { gesture }),
});

describe('a story of edits', () => {
  test('a step has its name, leaves the rest of the document as it is, and can be undone', () => {
    const first = beginStory(start);
    const story = told(first, volume(60));
    expect(story.now.name).toBe('Volume 60');
    expect(story.now.document).toEqual({
      ...start,
      rooms: [{ id: 'a', volumeM3: 60 }, start.rooms[1]],
    });
    expect(Reflect.get(Reflect.get(story.now.document as object, 'rooms'), 1)).toBe(start.rooms[1]);
    expect(undo(story).now.document).toBe(start);
  });

  test('a handle that moves is one step, and what comes after it is let go is another', () => {
    let story = beginStory(start);
    for (const value of [51, 52, 53]) story = told(story, volume(value, 'drag'));
    story = told(endGesture(story), volume(54, 'drag'));
    expect(story.past.map((step) => step.name)).toEqual(['Opened', 'Volume 53']);
    expect(undo(undo(story)).now.document).toBe(start);
  });

  test('a value that is there already is no step', () => {
    const story = beginStory(start);
    expect(told(story, volume(50))).toBe(story);
  });

  test('fields and lists that were left out are made on the way', () => {
    const story = told(beginStory(start), {
      name: 'x',
      changes: [
        { path: 'site.groundReflectance', value: 0.3 },
        { path: 'materials[+]', value: { id: 'wool' } },
        { path: 'calendar.year', value: undefined },
      ],
    });
    expect(story.now.document).toEqual({
      ...start,
      site: { groundReflectance: 0.3 },
      materials: [{ id: 'wool' }],
    });
  });

  test('a path that does not fit leaves the story and says where', () => {
    const result = tell(beginStory(start), {
      name: 'x',
      changes: [{ path: 'rooms[c].volumeM3', value: 1 }],
    });
    expect(result).toMatchObject({ ok: false, why: expect.stringContaining('rooms[c]') });
  });

  test('whatever is edited, undoing all comes back to the very document opened', () => {
    const act = fc.record({ value: fc.integer({ min: 1, max: 5 }), drag: fc.boolean() });
    fc.assert(
      fc.property(fc.array(act, { maxLength: 40 }), (acts) => {
        let story = beginStory(start);
        for (const { value, drag } of acts)
          story = told(story, volume(value, drag ? 'd' : undefined));
        const last = story.now.document;
        let count = 0;
        while (story.past.length > 0) {
          story = undo(story);
          count++;
        }
        expect(story.now.document).toBe(start);
        for (; count > 0; count--) story = redo(story);
        expect(story.now.document).toBe(last);
      }),
    );
  });
});

test('a new project passes the parser and holds the areas of its box', () => {
  const text = projectText(emptyProject('New house'));
  const parsed = parseProject(text, 'new.inglenook.json');
  expect(parsed.ok ? [] : parsed.faults).toEqual([]);
  expect(projectForm(JSON.parse(text))).not.toBeNull();
  expect(projectForm({ rooms: [] })).toBeNull();
});

test('differences name the entry by its id, and say when something came or went', () => {
  const after = {
    ...start,
    rooms: [
      { id: 'c', name: 'Study' },
      { id: 'a', volumeM3: 55 },
    ],
  };
  expect(differences(start, after)).toEqual([
    { path: 'rooms[a].volumeM3', before: '50', after: '55' },
    { path: 'rooms[b]', before: '{"id":"b","volumeM3":30}', after: 'nothing' },
    { path: 'rooms[c]', before: 'nothing', after: 'Study' },
  ]);
  expect(differences(after, structuredClone(after))).toEqual([]);
});

test('an id is made of the name, and no other has it', () => {
  expect(freeId('Wood-fibre board, 60 mm', [])).toBe('wood-fibre-board-60-mm');
  expect(freeId('Küche', ['kuche'])).toBe('ku-che');
  expect(freeId('Bad', ['bad', 'bad-2'])).toBe('bad-3');
  expect(freeId('…', [])).toBe('part');
});
