// The tokens as plain colours, for canvases, which cannot read custom properties.

import { useSyncExternalStore } from 'react';

const names = [
  'sheet',
  'paper',
  'well',
  'line',
  'edge',
  'ink',
  'ink-2',
  'ink-3',
  'heat-in',
  'heat-out',
  'sun',
  'sun-ink',
  'band',
  'band-ink',
  'air',
  'select',
  'warn',
  'ghost',
  'amount-0',
  'amount-1',
  'amount-2',
  'amount-3',
  'amount-4',
  'amount-5',
  'chill-0',
  'chill-1',
  'chill-2',
  'chill-3',
  'chill-4',
  'chill-5',
  'warm-0',
  'warm-1',
  'warm-2',
  'warm-3',
  'warm-4',
  'warm-5',
  'warm-6',
  'warm-7',
] as const;

export type InkName = (typeof names)[number];
export type Ink = Readonly<Record<InkName, string>>;

function read(): Ink {
  const style = getComputedStyle(document.documentElement);
  const entries = names.map((name) => [name, style.getPropertyValue(`--${name}`).trim() || '#000']);
  return Object.fromEntries(entries) as Ink; // one entry a name of the list above
}

let current: Ink | null = null;
let scheme: string | undefined;

function snapshot(): Ink {
  const now = document.documentElement.dataset.scheme;
  if (!current || now !== scheme) {
    scheme = now;
    current = read();
  }
  return current;
}

function subscribe(listen: () => void): () => void {
  const observer = new MutationObserver(listen);
  observer.observe(document.documentElement, { attributeFilter: ['data-scheme'] });
  return () => observer.disconnect();
}

/** The colours of the scheme in force; redraws when it changes. */
export function useInk(): Ink {
  return useSyncExternalStore(subscribe, snapshot);
}
