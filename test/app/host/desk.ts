// A folder with a project, a weather table and a demo, and a shell on it, for the tests of the host.

import { mkdirSync, mkdtempSync, realpathSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Shell } from '../../../app/host/shell.ts';

export interface Desk {
  readonly root: string;
  readonly work: string;
  readonly shell: Shell;
  at(name: string): string;
  clear(): void;
}

export function layDesk(changes: Partial<Shell> = {}): Desk {
  const root = realpathSync(mkdtempSync(join(tmpdir(), 'inglenook-desk-')));
  const work = join(root, 'work');
  for (const folder of ['work/weather', 'demo', 'data', 'page', 'elsewhere']) {
    mkdirSync(join(root, folder), { recursive: true });
  }
  writeFileSync(join(work, 'house.inglenook.json'), '{"name":"house"}\n');
  writeFileSync(join(work, 'weather', 'year.csv'), 'hour,dryBulbC\n0,4\n');
  writeFileSync(join(root, 'demo', 'demo.inglenook.json'), '{"name":"demo"}\n');
  writeFileSync(join(root, 'elsewhere', 'secret.inglenook.json'), '{"name":"secret"}\n');
  writeFileSync(
    join(root, 'page', 'index.html'),
    '<!doctype html><meta name="style-nonce" content="__NONCE__"><script src="a.js"></script>',
  );
  writeFileSync(join(root, 'page', 'a.js'), 'export {};\n');
  writeFileSync(join(root, 'page', 'notes.md'), 'of no served type\n');
  writeFileSync(join(root, 'secret.js'), 'outside of the page\n');
  return {
    root,
    work,
    shell: {
      kind: 'browser',
      version: '1.2.3',
      folders: [work],
      demoFolder: join(root, 'demo'),
      dataFolder: join(root, 'data'),
      startWith: null,
      dialogs: null,
      ...changes,
    },
    at: (name) => join(root, name),
    clear: () => rmSync(root, { recursive: true, force: true }),
  };
}
