// Pieces of SVG. Every drawing is as wide as the sheet and shares its left and right edge with the
// others, so that the same month stands under the same month.

import { type Markup, markup } from '../markup.ts';

export const sheet = { width: 760, left: 84, right: 640 } as const;

/** Coordinates to a tenth of a pixel. */
export const px = (value: number): string => {
  const text = value.toFixed(1).replace(/\.0$/, '');
  return text === '-0' ? '0' : text;
};

/** A whole drawing. `equivalent` says in words what it shows. */
export function drawing(height: number, equivalent: string, parts: readonly Markup[]): Markup {
  const box = `0 0 ${sheet.width} ${Math.ceil(height)}`;
  return markup`<svg viewBox="${box}" role="img" aria-label="${equivalent}">${parts}</svg>\n`;
}

export function words(x: number, y: number, text: string, kind = ''): Markup {
  return markup`<text x="${px(x)}" y="${px(y)}" class="${kind}">${text}</text>`;
}

export function box(x: number, y: number, width: number, height: number, kind: string): Markup {
  return markup`<rect x="${px(x)}" y="${px(y)}" width="${px(width)}" height="${px(height)}" class="${kind}"/>`;
}

export function path(d: string, kind: string): Markup {
  return markup`<path d="${d}" class="${kind}"/>`;
}

/** A line through points; a gap where a value is not a number. */
export function polyline(points: Iterable<readonly [x: number, y: number]>): string {
  let d = '';
  let isDown = false;
  for (const [x, y] of points) {
    if (Number.isFinite(y)) d += `${isDown ? 'L' : 'M'}${px(x)} ${px(y)}`;
    isDown = Number.isFinite(y);
  }
  return d;
}

/** 45° hatch over a shape, for print in grey; `name` must be unique in the page. */
export function hatch(name: string): Markup {
  return markup`<defs><pattern id="${name}" width="4" height="4" patternUnits="userSpaceOnUse" patternTransform="rotate(45)"><rect width="0.8" height="4" class="hatch-line"/></pattern></defs>`;
}

/** The same shape as a hatched one, shown in print alone. */
export function hatched(d: string, name: string): Markup {
  return markup`<path d="${d}" class="print-only" fill="url(#${name})"/>`;
}

/** Rough width of a text in the drawing's size, for keeping words apart [px]. */
export const widthOf = (text: string): number => text.length * 6.2;

/** A text cut to so many characters. */
export const cut = (text: string, length: number): string =>
  text.length <= length ? text : `${text.slice(0, length - 1).trimEnd()}…`;

/** Heights moved so that neighbours keep `pitch`, in the order given by height. */
export function apart(heights: readonly number[], pitch: number): number[] {
  const order = heights.map((y, i) => ({ y, i })).sort((a, b) => a.y - b.y);
  for (let round = 0; round < 20; round++) {
    for (let k = 1; k < order.length; k++) {
      const [a, b] = [order[k - 1], order[k]];
      if (!a || !b || b.y - a.y >= pitch - 1e-9) continue;
      const middle = (a.y + b.y) / 2;
      a.y = middle - pitch / 2;
      b.y = middle + pitch / 2;
    }
  }
  const moved = [...heights];
  for (const { y, i } of order) moved[i] = y;
  return moved;
}
