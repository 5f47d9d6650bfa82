// Who may talk to the host: the one window that was opened with the start address. Its token is good
// once and is exchanged for a cookie that scripts cannot read and other sites cannot send.

import { randomBytes, timingSafeEqual } from 'node:crypto';

const secret = () => randomBytes(32).toString('base64url');

function same(given: string, wanted: string): boolean {
  const [a, b] = [Buffer.from(given), Buffer.from(wanted)];
  return a.length === b.length && timingSafeEqual(a, b);
}

export interface Session {
  readonly token: string;
  /** The cookie's header for the right token, once; null for a wrong or used one. */
  open(token: string): string | null;
  holds(cookieHeader: string | undefined): boolean;
}

export function newSession(): Session {
  const token = secret();
  // A browser keeps one jar for all ports of a machine: a name of our own keeps two programs apart.
  const cookieName = `inglenook-${secret().slice(0, 8)}`;
  const id = secret();
  let used = false;
  return {
    token,
    open(given) {
      if (used || !same(given, token)) return null;
      used = true;
      return `${cookieName}=${id}; HttpOnly; SameSite=Strict; Path=/`;
    },
    holds(header) {
      const pairs = (header ?? '').split(';').map((pair) => pair.trim().split('='));
      return pairs.some(([name, value]) => name === cookieName && same(value ?? '', id));
    },
  };
}
