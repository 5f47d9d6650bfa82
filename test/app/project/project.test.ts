import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  begin,
  checkWeatherDigest,
  edit,
  type History,
  projectText,
  redo,
  undo,
} from '../../../app/project/index.ts';
import { parseProject } from '../../../engine/building/index.ts';
import { faultText } from '../../../weather/index.ts';
import { sampleText } from '../sample.ts';

describe('undo', () => {
  test('an edit that changes nothing is no step', () => {
    const doc = { name: 'a' };
    const history = begin(doc);
    expect(edit(history, doc)).toBe(history);
  });

  test('a moving slider is one step', () => {
    let history = edit(begin(0), 1);
    for (const value of [2, 3, 4]) history = edit(history, value, 'merge');
    expect(history.now).toBe(4);
    expect(undo(history).now).toBe(0);
  });

  test('a new edit after undo drops what was undone', () => {
    const history = edit(undo(edit(begin('a'), 'b')), 'c');
    expect(redo(history).now).toBe('c');
    expect(undo(history).now).toBe('a');
  });

  test('undo and redo at their ends change nothing', () => {
    const history = begin('a');
    expect(undo(history)).toBe(history);
    expect(redo(history)).toBe(history);
  });

  test('whatever is done, undoing all and redoing all comes back to the same document', () => {
    const act = fc.oneof(fc.nat(9), fc.constant('undo' as const), fc.constant('redo' as const));
    fc.assert(
      fc.property(fc.array(act, { maxLength: 60 }), (acts) => {
        let history: History<number> = begin(-1);
        for (const one of acts) {
          if (one === 'undo') history = undo(history);
          else if (one === 'redo') history = redo(history);
          else history = edit(history, one);
        }
        let first = history;
        while (first.past.length > 0) first = undo(first);
        expect(first.now).toBe(-1);
        let again = first;
        for (let i = 0; i < history.past.length; i++) again = redo(again);
        expect(again).toEqual(history);
      }),
    );
  });
});

describe('the text of a file', () => {
  test('ends with a line break, keeps the order of fields and can be read back', () => {
    const document = { format: 'x', rooms: [{ id: 'a', areaM2: 0.1 + 0.2 }] };
    const text = projectText(document);
    expect(text).toMatch(/^\{\n {2}"format": "x",\n[\s\S]*\}\n$/);
    expect(JSON.parse(text)).toEqual(document);
  });

  test('a number that JSON would silently turn into null is refused', () => {
    expect(() => projectText({ areaM2: Number.NaN })).toThrow('NaN at "areaM2"');
    expect(() => projectText({ max: Number.POSITIVE_INFINITY })).toThrow('Infinity at "max"');
  });

  test('any JSON document survives the way to disk and back', () => {
    fc.assert(
      fc.property(fc.dictionary(fc.string(), fc.jsonValue()), (document) => {
        // -0 is the one number that JSON does not keep.
        const plain: unknown = JSON.parse(JSON.stringify(document));
        expect(JSON.parse(projectText(document))).toEqual(plain);
      }),
    );
  });
});

describe('the weather a project was made with', () => {
  const sha256 = 'a'.repeat(64);
  function building(weather: object) {
    const parsed = parseProject(sampleText({ weather }), 'house.inglenook.json');
    if (!parsed.ok) throw new Error(parsed.faults.map(faultText).join('\n'));
    return parsed.value;
  }

  test('the same digest passes, another one is a fault that names both, none is a note', () => {
    const file = 'weather/year.csv';
    const check = (weather: object) => checkWeatherDigest(building(weather), 'house', sha256);
    expect(check({ file, sha256 })).toEqual({ kind: 'same' });
    const none = check({ file });
    expect(none.kind === 'unknown' && none.note).toContain(file);
    const other = check({ file, sha256: 'b'.repeat(64) });
    const text = other.kind === 'different' ? faultText(other.fault) : '';
    expect(text).toContain('house, weather.sha256: found bbbb');
    expect(text).toContain('expected aaaa');
    expect(text).toContain('Put the table back');
  });
});
