// The page comes from a scheme of its own, not from file://, so that it has an origin, and the same
// policy as in a browser.

import { pageFile } from '../page/page-file.ts';
import { newNonce, pageHeaders } from '../page/policy.ts';

export const scheme = 'inglenook';
const host = 'window';
export const pageOrigin = `${scheme}://${host}`;

export async function answerPage(folder: string, request: Request): Promise<Response> {
  const nonce = newNonce();
  const url = new URL(request.url);
  const file =
    url.host === host && request.method === 'GET'
      ? await pageFile(folder, url.pathname, nonce)
      : null;
  if (file === null) {
    return new Response('Not here.', { status: 404, headers: pageHeaders(nonce) });
  }
  return new Response(file.body, {
    headers: { ...pageHeaders(nonce), 'content-type': file.type },
  });
}
