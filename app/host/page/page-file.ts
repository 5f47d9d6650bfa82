import { readFile, realpath, stat } from 'node:fs/promises';
import { extname, join, sep } from 'node:path';

const types: Readonly<Record<string, string>> = {
  '.html': 'text/html; charset=utf-8',
  '.js': 'text/javascript; charset=utf-8',
  '.css': 'text/css; charset=utf-8',
  '.json': 'application/json; charset=utf-8',
  '.svg': 'image/svg+xml',
  '.png': 'image/png',
  '.woff2': 'font/woff2',
  '.woff': 'font/woff',
};

export interface PageFile {
  readonly type: string;
  readonly body: Uint8Array<ArrayBuffer>;
}

/**
 * A file of the built page by the path of an address, or null. Only real files of known types inside
 * the folder, after links are followed; the page itself gets the nonce written in.
 */
export async function pageFile(
  folder: string,
  urlPath: string,
  nonce: string,
): Promise<PageFile | null> {
  try {
    const name = decodeURIComponent(urlPath);
    const root = await realpath(folder);
    const path = await realpath(join(root, name === '/' ? 'index.html' : name));
    const type = types[extname(path)];
    if (!path.startsWith(root + sep) || type === undefined) return null;
    if (!(await stat(path)).isFile()) return null;
    if (extname(path) !== '.html') return { type, body: new Uint8Array(await readFile(path)) };
    const page = (await readFile(path, 'utf8')).replaceAll('__NONCE__', nonce);
    return { type, body: new TextEncoder().encode(page) };
  } catch {
    return null; // not there, or not a path: the same answer, which tells a stranger nothing
  }
}
