// What is drawn on a chart beside its lines and bars: axis words, the measured edge, the band, names
// at the ends of lines, the hour's mark. Each is a painter; a chart takes a list of them.

import type { Ink } from './ink.ts';
import { type EdgeUnit, edgeBars } from './measured-edge.ts';

export interface View {
  readonly ctx: CanvasRenderingContext2D;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
  readonly x: (value: number) => number;
  readonly y: (value: number) => number;
  readonly ink: Ink;
}

export type Painter = (view: View) => void;

export const fontOf = (weight = 400, size = 11) => `${weight} ${size}px 'IBM Plex Sans'`;

/** Half a pixel in, so that a hairline fills one row of pixels. */
const crisp = (value: number) => Math.round(value) + 0.5;

export function words(
  { ctx }: View,
  text: string,
  x: number,
  y: number,
  color: string,
  how: { align?: CanvasTextAlign; weight?: number; halo?: string } = {},
): void {
  ctx.font = fontOf(how.weight);
  ctx.textAlign = how.align ?? 'left';
  ctx.textBaseline = 'alphabetic';
  if (how.halo) {
    ctx.lineWidth = 4;
    ctx.lineJoin = 'round';
    ctx.strokeStyle = how.halo;
    ctx.strokeText(text, x, y);
  }
  ctx.fillStyle = color;
  ctx.fillText(text, x, y);
}

/** Hairlines across and their values at the left; the top one carries the unit. */
export function gridLines(
  ticks: readonly number[],
  text: (tick: number) => string,
  unit: string,
): Painter {
  return (view) => {
    const { ctx, left, right, y, ink } = view;
    const last = ticks.length - 1;
    ticks.forEach((tick, i) => {
      const at = y(tick);
      ctx.strokeStyle = ink.line;
      ctx.lineWidth = 1;
      ctx.beginPath();
      ctx.moveTo(left, crisp(at));
      ctx.lineTo(right, crisp(at));
      ctx.stroke();
      const label = i === last ? `${text(tick)} ${unit}` : text(tick);
      words(view, label, left - 8, at + 4, ink['ink-2'], { align: 'right' });
    });
  };
}

/** Upright hairlines where units of the edge meet. */
export function unitLines(units: readonly EdgeUnit[]): Painter {
  return ({ ctx, top, bottom, x, ink }) => {
    ctx.strokeStyle = ink.line;
    ctx.lineWidth = 1;
    for (const unit of units.slice(1)) {
      ctx.beginPath();
      ctx.moveTo(crisp(x(unit.from)), top);
      ctx.lineTo(crisp(x(unit.from)), bottom);
      ctx.stroke();
    }
  };
}

export const edgeHeight = 4;

/** The measured edge below the plot, with the units' names; `strong` is the unit to set in bold. */
export function measuredEdge(units: readonly EdgeUnit[], strong = -1): Painter {
  return (view) => {
    const { ctx, left, right, bottom, x, ink } = view;
    const y = Math.round(bottom) + 3;
    ctx.fillStyle = ink.sheet;
    ctx.fillRect(left, y, right - left, edgeHeight);
    const bars = edgeBars(units, x);
    for (const [i, bar] of bars.entries()) {
      ctx.fillStyle = ink.ink;
      if (bar.isFilled) ctx.fillRect(bar.x, y, bar.width, edgeHeight);
      const isStrong = i === strong;
      words(view, bar.label, bar.x + bar.width / 2, y + 17, isStrong ? ink.ink : ink['ink-2'], {
        align: 'center',
        weight: isStrong ? 600 : 400,
      });
    }
    ctx.strokeStyle = ink.ink;
    ctx.lineWidth = 1;
    ctx.strokeRect(left + 0.5, y + 0.5, right - left - 1, edgeHeight - 1);
  };
}

/** The comfort band in the hours that have one. */
export function bandArea(from: number, low: Float64Array, high: Float64Array): Painter {
  return ({ ctx, x, y, ink }) => {
    for (let i = 0; i < low.length; i++) {
      if (Number.isNaN(low[i])) continue;
      let end = i;
      while (end + 1 < low.length && low[end + 1] === low[i] && high[end + 1] === high[i]) end++;
      const x0 = x(from + i);
      const width = x(from + end + 1) - x0;
      const yHigh = y(high[i]);
      const yLow = y(low[i]);
      ctx.fillStyle = ink.band;
      ctx.fillRect(x0, yHigh, width, yLow - yHigh);
      ctx.strokeStyle = ink['band-ink'];
      ctx.lineWidth = 1;
      for (const edge of [yHigh, yLow]) {
        ctx.beginPath();
        ctx.moveTo(x0, crisp(edge));
        ctx.lineTo(x0 + width, crisp(edge));
        ctx.stroke();
      }
      i = end;
    }
  };
}

/** The occupied hours' part of the room's line beyond its band, shaded from the band to the line. */
export function beyondBand(
  from: number,
  values: Float64Array,
  low: Float64Array,
  high: Float64Array,
): Painter {
  return ({ ctx, x, y, ink }) => {
    for (let i = 0; i < values.length; i++) {
      const x0 = x(from + i);
      const width = x(from + i + 1) - x0 + 0.5;
      if (values[i] > high[i]) {
        ctx.fillStyle = ink['amount-2'];
        ctx.fillRect(x0, y(values[i]), width, y(high[i]) - y(values[i]));
      } else if (values[i] < low[i]) {
        ctx.fillStyle = ink['chill-2'];
        ctx.fillRect(x0, y(low[i]), width, y(values[i]) - y(low[i]));
      }
    }
  };
}

export interface EndLabel {
  readonly text: string;
  readonly value: number;
  readonly color: string;
  readonly isStrong?: boolean;
}

/** Names at the right ends of lines, moved apart where they would touch. */
export function endLabels(labels: readonly EndLabel[]): Painter {
  return (view) => {
    const placed = labels
      .map((label) => ({
        ...label,
        at: Math.min(view.bottom, Math.max(view.top, view.y(label.value))),
      }))
      .sort((a, b) => a.at - b.at);
    let lowest = -Infinity;
    for (const label of placed) {
      const at = Math.max(label.at, lowest + 14);
      lowest = at;
      words(view, label.text, view.right + 5, at + 4, label.color, {
        weight: label.isStrong ? 600 : 400,
      });
    }
  };
}

/** Words in the plot, with a halo of the ground they stand on. */
export function note(
  text: string,
  at: { x: number; y: number; align: CanvasTextAlign },
  color: (ink: Ink) => string,
  halo: (ink: Ink) => string,
): Painter {
  return (view) => {
    words(view, text, view.x(at.x), view.y(at.y), color(view.ink), {
      align: at.align,
      weight: 600,
      halo: halo(view.ink),
    });
  };
}

/** The hour's mark: dashed under the pointer, solid with a flag once pinned. */
export function hourMark(at: number, text: string, isPinned: boolean, ringAt?: number): Painter {
  return (view) => {
    const { ctx, left, right, top, bottom, x, y, ink } = view;
    const px = x(at);
    if (px < left - 1 || px > right + 1) return;
    ctx.strokeStyle = ink.select;
    ctx.lineWidth = 1.5;
    ctx.setLineDash(isPinned ? [] : [3, 2]);
    ctx.beginPath();
    ctx.moveTo(px, top - 6);
    ctx.lineTo(px, bottom + 3);
    ctx.stroke();
    ctx.setLineDash([]);
    if (isPinned) {
      ctx.fillStyle = ink.select;
      ctx.beginPath();
      ctx.moveTo(px - 4, top - 14);
      ctx.lineTo(px + 4, top - 14);
      ctx.lineTo(px + 4, top - 6);
      ctx.lineTo(px, top - 2);
      ctx.lineTo(px - 4, top - 6);
      ctx.fill();
    }
    if (ringAt !== undefined) {
      ctx.beginPath();
      ctx.arc(px, y(ringAt), 4.5, 0, 2 * Math.PI);
      ctx.fillStyle = ink.sheet;
      ctx.fill();
      ctx.lineWidth = 2;
      ctx.stroke();
    }
    if (!text) return;
    ctx.font = fontOf(600);
    const width = ctx.measureText(text).width;
    const isLeft = px + 10 + width > right + 40;
    words(view, text, isLeft ? px - 9 : px + 9, top - 6, ink.select, {
      align: isLeft ? 'right' : 'left',
      weight: 600,
      halo: ink.sheet,
    });
  };
}
