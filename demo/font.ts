import { readFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import type { Font } from '../app/report/index.ts';

/** The window's typeface from the installed packages; none where they are not there. */
export async function reportFonts(): Promise<Font[]> {
  const find = createRequire(import.meta.url).resolve;
  try {
    return await Promise.all(
      ([400, 600] as const).map(async (weight) => {
        const file = `@fontsource/ibm-plex-sans/files/ibm-plex-sans-latin-${weight}-normal.woff2`;
        return { weight, woff2Base64: (await readFile(find(file))).toString('base64') };
      }),
    );
  } catch {
    return []; // the page names the system's own sans-serif next
  }
}
