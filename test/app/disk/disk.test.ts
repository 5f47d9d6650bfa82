import { createHash } from 'node:crypto';
import {
  chmodSync,
  existsSync,
  lstatSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  statSync,
  symlinkSync,
  truncateSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { readText, writeFileWhole, writeFolderWhole } from '../../../app/disk/index.ts';
import { faultText } from '../../../weather/index.ts';

let folder: string;
const at = (name: string) => join(folder, name);

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'inglenook-disk-'));
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

const options = { expected: 'a weather table', limitBytes: 1000, allowLegacyText: true };

async function refusal(name: string, wanted = options): Promise<string> {
  const read = await readText(at(name), wanted);
  expect(read.ok).toBe(false);
  return read.ok ? '' : faultText(read.faults[0] as never).replace(folder, '…');
}

describe('reading', () => {
  test('gives the text, its size and the SHA-256 of its bytes', async () => {
    writeFileSync(at('a.csv'), '\ufeffθ,°C\n1,2\n');
    const read = await readText(at('a.csv'), options);
    const sha256 = createHash('sha256')
      .update(readFileSync(at('a.csv')))
      .digest('hex');
    // The byte order mark belongs to the bytes and not to the text.
    expect(read).toEqual({
      ok: true,
      value: { text: 'θ,°C\n1,2\n', sha256, bytes: 14, notes: [] },
    });
  });

  test('SHA-256 is that of the published example "abc" (FIPS 180-2, appendix B.1)', async () => {
    writeFileSync(at('abc'), 'abc');
    const read = await readText(at('abc'), options);
    expect(read.ok && read.value.sha256).toBe(
      'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad',
    );
  });

  test('names what is wrong with a path, and what to do', async () => {
    mkdirSync(at('folder'));
    writeFileSync(at('empty.csv'), '');
    symlinkSync(at('loop'), at('loop'));
    expect(await refusal('none.csv')).toBe(
      '…/none.csv, the whole file: found nothing at this path, expected a weather table. ' +
        'Check the spelling and the folder.',
    );
    expect(await refusal('folder')).toContain('found a folder');
    expect(await refusal('empty.csv')).toContain('found an empty file');
    expect(await refusal('empty.csv/x')).toContain('found a file where a folder is named');
    expect(await refusal('loop')).toContain('a link that leads back to itself');
    expect(await refusal(`${'x'.repeat(300)}`)).toContain('a name that is too long');
  });

  test('refuses a file above the limit without reading it', async () => {
    writeFileSync(at('huge.csv'), 'x');
    truncateSync(at('huge.csv'), 5e9); // sparse: takes no room on disk
    expect(await refusal('huge.csv')).toContain('found 5000.0 MB');
  });

  test('refuses what is not text, by name where it can tell', async () => {
    writeFileSync(at('a.zip'), Buffer.from([0x50, 0x4b, 3, 4, 20, 0]));
    writeFileSync(at('b.gz'), Buffer.from([0x1f, 0x8b, 8, 0]));
    writeFileSync(at('d.csv'), Buffer.from([0x61, 0, 0x62]));
    expect(await refusal('a.zip')).toContain('found a ZIP archive or a workbook');
    expect(await refusal('b.gz')).toContain('found a gzip archive');
    expect(await refusal('d.csv')).toContain('found binary data');
  });

  test('reads legacy text only where it may, and says so', async () => {
    writeFileSync(at('old.csv'), Buffer.from([0x4d, 0xfc, 0x6e])); // "Mün" in Windows-1252
    const read = await readText(at('old.csv'), options);
    expect(read.ok && read.value.text).toBe('Mün');
    expect(read.ok && read.value.notes).toHaveLength(1);
    writeFileSync(at('wide.csv'), Buffer.from('\ufeffθ,1', 'utf16le'));
    const wide = await readText(at('wide.csv'), options);
    expect(wide.ok && wide.value).toMatchObject({ text: 'θ,1', notes: ['The text is in UTF-16.'] });
    const strict = { expected: 'a project file', limitBytes: 1000, allowLegacyText: false };
    expect(await refusal('old.csv', strict)).toContain('found bytes that are not UTF-8');
    expect(await refusal('wide.csv', strict)).toContain('found text in UTF-16');
  });
});

describe('writing a file', () => {
  test('replaces the content, keeps the rights, and leaves nothing else behind', async () => {
    writeFileSync(at('a.json'), 'old');
    chmodSync(at('a.json'), 0o640);
    expect(await writeFileWhole(at('a.json'), 'new')).toEqual({ ok: true, value: null });
    expect(readFileSync(at('a.json'), 'utf8')).toBe('new');
    expect(statSync(at('a.json')).mode & 0o777).toBe(0o640);
    expect(readdirSync(folder)).toEqual(['a.json']);
  });

  test('a reader at any moment sees the old text or the new, never a part', async () => {
    const [old, fresh] = ['o'.repeat(4e6), 'n'.repeat(4e6)];
    writeFileSync(at('a.json'), old);
    let busy = true;
    const seen = new Set<string>();
    const writing = writeFileWhole(at('a.json'), fresh).finally(() => {
      busy = false;
    });
    while (busy) {
      seen.add(readFileSync(at('a.json'), 'utf8'));
      await new Promise((next) => setImmediate(next));
    }
    await writing;
    seen.add(readFileSync(at('a.json'), 'utf8'));
    for (const text of seen) expect(text === old || text === fresh).toBe(true);
    expect(seen.has(fresh)).toBe(true);
  });

  test('writes through a link and keeps it', async () => {
    writeFileSync(at('real.json'), 'old');
    symlinkSync(at('real.json'), at('link.json'));
    await writeFileWhole(at('link.json'), 'new');
    expect(lstatSync(at('link.json')).isSymbolicLink()).toBe(true);
    expect(readFileSync(at('real.json'), 'utf8')).toBe('new');
  });

  test('a write that cannot be is refused with the reason, and the old file stays', async () => {
    mkdirSync(at('folder'));
    const refused = await writeFileWhole(at('folder'), 'x');
    expect(refused.ok).toBe(false);
    const missing = await writeFileWhole(at('none/a.json'), 'x');
    expect(!missing.ok && missing.faults[0]?.found).toBe('nothing at this path');
    expect(readdirSync(folder)).toEqual(['folder']);
  });
});

describe('writing a folder', () => {
  const files = new Map([
    ['a.csv', '1'],
    ['b.csv', '2'],
  ]);

  test('a new folder appears with every file in it', async () => {
    expect((await writeFolderWhole(at('deep/out'), files)).ok).toBe(true);
    expect(readdirSync(at('deep'))).toEqual(['out']);
    expect(readdirSync(at('deep/out')).sort()).toEqual(['a.csv', 'b.csv']);
  });

  test('in a folder that is in use, the other files stay', async () => {
    mkdirSync(at('out'));
    writeFileSync(at('out/notes.txt'), 'mine');
    writeFileSync(at('out/a.csv'), 'old');
    expect((await writeFolderWhole(at('out'), files)).ok).toBe(true);
    expect(readdirSync(at('out')).sort()).toEqual(['a.csv', 'b.csv', 'notes.txt']);
    expect(readFileSync(at('out/a.csv'), 'utf8')).toBe('1');
    expect(readdirSync(folder)).toEqual(['out']);
  });

  test('where the name is taken by a file, nothing is written', async () => {
    writeFileSync(at('out'), 'a file');
    const refused = await writeFolderWhole(at('out'), files);
    expect(!refused.ok && refused.faults[0]?.expected).toBe('a folder to write into');
    expect(readFileSync(at('out'), 'utf8')).toBe('a file');
    expect(existsSync(at('out/a.csv'))).toBe(false);
    expect(readdirSync(folder)).toEqual(['out']);
  });
});
