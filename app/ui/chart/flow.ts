// Geometry of a flow picture: what comes in at the left, the room as an upright bar in the middle,
// what goes out or is taken up at the right. Widths are to one scale, largest first from the top,
// and the figures of both sides add up to the sum written on the bar.

import { shareOut } from './share-out.ts';

export interface FlowPart {
  readonly key: string;
  /** Positive into the room. */
  readonly value: number;
}

export interface FlowStream {
  readonly key: string;
  /** Rounded so that its side adds up. */
  readonly shown: number;
  readonly width: number;
  /** Upper edge at the outer end and at the bar. */
  readonly outerY: number;
  readonly innerY: number;
  /** Middle of the words, kept apart from the neighbours'. */
  readonly labelY: number;
}

export interface FlowPicture {
  readonly sum: number;
  readonly barHeight: number;
  readonly barY: number;
  readonly height: number;
  readonly into: readonly FlowStream[];
  readonly out: readonly FlowStream[];
}

const gap = 9;
const labelPitch = 16;

/** The stream that is also a finding keeps its own rounding; the others share what is left. */
const findingKey = 'heating';

function shownValues(parts: readonly FlowPart[], sum: number): number[] {
  const finding = parts.find((part) => part.key === findingKey);
  const kept = finding ? Math.round(finding.value) : 0;
  const others = parts.filter((part) => part !== finding);
  if (others.length === 0) return [sum];
  const shared = shareOut(
    others.map((part) => part.value),
    sum - kept,
  );
  return parts.map((part) => (part === finding ? kept : (shared[others.indexOf(part)] ?? 0)));
}

function side(parts: readonly FlowPart[], sum: number, perUnit: number, barY: number) {
  const rounded = shownValues(parts, sum);
  let outerY = 0;
  let innerY = barY;
  let lastLabel = -Infinity;
  const streams: FlowStream[] = [];
  parts.forEach((part, i) => {
    const width = part.value * perUnit;
    const labelY = Math.max(outerY + width / 2, lastLabel + labelPitch);
    const top = Math.max(outerY, labelY - width / 2);
    streams.push({ key: part.key, shown: rounded[i] ?? 0, width, outerY: top, innerY, labelY });
    lastLabel = labelY;
    outerY = top + width + gap;
    innerY += width;
  });
  return { streams, bottom: Math.max(outerY - gap, lastLabel + labelPitch / 2) };
}

/**
 * `barHeight` is the height of the whole. Parts that round to nothing are left out of the picture,
 * and their heat is spread by the rounding. The sides must balance; a rest is named by the caller.
 */
export function layFlow(parts: readonly FlowPart[], barHeight: number): FlowPicture {
  const bySize = (a: FlowPart, b: FlowPart) => b.value - a.value;
  const into = parts.filter((part) => part.value >= 0.5).sort(bySize);
  const out = parts
    .filter((part) => part.value <= -0.5)
    .map((part) => ({ ...part, value: -part.value }))
    .sort(bySize);
  const total = (side: readonly FlowPart[]) => side.reduce((sum, part) => sum + part.value, 0);
  const whole = Math.max(total(into), total(out));
  const sum = Math.round(whole);
  const perUnit = whole > 0 ? barHeight / whole : 0;
  const barY = (gap * Math.max(0, Math.max(into.length, out.length) - 1)) / 2;
  const left = side(into, Math.min(sum, Math.round(total(into))), perUnit, barY);
  const right = side(out, Math.min(sum, Math.round(total(out))), perUnit, barY);
  const height = Math.max(left.bottom, right.bottom, barY + barHeight + 16);
  return { sum, barHeight, barY, height, into: left.streams, out: right.streams };
}

/** A stream's outline: two level curves from its outer end to the bar. */
export function streamPath(x0: number, y0: number, x1: number, y1: number, width: number): string {
  const mid = (x0 + x1) / 2;
  const f = (value: number) => value.toFixed(1);
  return (
    `M${f(x0)} ${f(y0)}C${f(mid)} ${f(y0)} ${f(mid)} ${f(y1)} ${f(x1)} ${f(y1)}` +
    `L${f(x1)} ${f(y1 + width)}C${f(mid)} ${f(y1 + width)} ${f(mid)} ${f(y0 + width)} ` +
    `${f(x0)} ${f(y0 + width)}Z`
  );
}
