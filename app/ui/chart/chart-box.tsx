// One Chart.js chart on the sheet: registered parts only, nothing animated, no axes or legend of its
// own. Its lines and bars come as data, everything else as painters, so that every chart has the
// same measured edge, the same margins and the same mark.

import {
  BarController,
  BarElement,
  Chart,
  type ChartDataset,
  LinearScale,
  LineController,
  LineElement,
  PointElement,
} from 'chart.js';
import { useEffect, useRef } from 'react';
import { type Ink, useInk } from './ink.ts';
import type { Painter, View } from './painter.ts';
import { usePlotMargin } from './plot-margin.ts';
import { useWidth } from './use-width.ts';

Chart.register(BarController, BarElement, LinearScale, LineController, LineElement, PointElement);

export interface Point {
  readonly x: number;
  readonly y: number;
}

export interface Layer {
  readonly kind: 'line' | 'bar' | 'steps';
  readonly points: Point[];
  readonly color: (ink: Ink) => string;
  readonly width?: number;
  /** Outline of a bar. */
  readonly border?: (ink: Ink) => string;
}

export interface ChartBoxProps {
  readonly layers: readonly Layer[];
  readonly x: { readonly min: number; readonly max: number };
  readonly y: { readonly min: number; readonly max: number; readonly isHanging?: boolean };
  readonly under: readonly Painter[];
  readonly over: readonly Painter[];
  readonly height: number;
  readonly top?: number;
  readonly bottom?: number;
  /** Where the pointer is on x; `null` when it leaves. */
  readonly onHover?: (x: number | null) => void;
  readonly onPick?: (x: number) => void;
}

function dataset(layer: Layer, ink: Ink): ChartDataset<'line' | 'bar', Point[]> {
  const color = layer.color(ink);
  if (layer.kind === 'bar') {
    return {
      type: 'bar',
      grouped: false,
      data: layer.points,
      backgroundColor: color,
      barThickness: layer.width ?? 20,
      ...(layer.border ? { borderColor: layer.border(ink), borderWidth: 0.8 } : {}),
    };
  }
  return {
    type: 'line',
    data: layer.points,
    borderColor: color,
    borderWidth: layer.width ?? 1.3,
    pointRadius: 0,
    borderJoinStyle: 'round',
    stepped: layer.kind === 'steps' ? 'before' : false,
  };
}

function viewOf(chart: Chart, ink: Ink): View {
  const { left, right, top, bottom } = chart.chartArea;
  const scale = (name: string) => (value: number) =>
    chart.scales[name]?.getPixelForValue(value) ?? 0;
  return { ctx: chart.ctx, left, right, top, bottom, x: scale('x'), y: scale('y'), ink };
}

function draw(chart: Chart, ink: Ink, painters: readonly Painter[]) {
  const view = viewOf(chart, ink);
  for (const paint of painters) {
    chart.ctx.save();
    paint(view);
    chart.ctx.restore();
  }
}

export function ChartBox(props: ChartBoxProps) {
  const { height, top = 12, bottom = 24, onHover, onPick } = props;
  const [box, width] = useWidth<HTMLDivElement>();
  const canvas = useRef<HTMLCanvasElement>(null);
  const margin = usePlotMargin();
  const ink = useInk();
  const now = useRef({ props, ink });
  now.current = { props, ink };
  const chart = useRef<Chart | null>(null);

  useEffect(() => {
    if (!canvas.current?.getContext('2d')) return; // no canvas in the tests' stand-in page
    const made = new Chart<'line' | 'bar', Point[]>(canvas.current, {
      type: 'line',
      data: { datasets: [] },
      options: {
        responsive: false,
        maintainAspectRatio: false,
        animation: false,
        events: [],
        normalized: true,
        layout: { padding: { left: margin.left, right: margin.right, top, bottom } },
        scales: {
          x: { type: 'linear', display: false },
          y: { type: 'linear', display: false },
        },
      },
      plugins: [
        {
          id: 'painters',
          beforeDatasetsDraw: (c) => draw(c as Chart, now.current.ink, now.current.props.under),
          afterDatasetsDraw: (c) => draw(c as Chart, now.current.ink, now.current.props.over),
        },
      ],
    });
    chart.current = made as unknown as Chart; // the class is invariant in its kinds of chart
    return () => {
      chart.current = null;
      made.destroy();
    };
  }, [top, bottom, margin]);

  useEffect(() => {
    const c = chart.current;
    if (!c) return;
    c.data.datasets = props.layers.map((layer) => dataset(layer, ink)) as typeof c.data.datasets;
    c.options.scales = {
      x: { type: 'linear', display: false, min: props.x.min, max: props.x.max, offset: false },
      y: {
        type: 'linear',
        display: false,
        min: props.y.min,
        max: props.y.max,
        reverse: props.y.isHanging ?? false,
      },
    };
    c.resize(width, height);
    c.update('none');
  });

  useEffect(() => {
    let isHere = true;
    void document.fonts?.ready.then(() => isHere && chart.current?.draw());
    return () => {
      isHere = false;
    };
  }, []);

  function at(clientX: number): number | null {
    const rect = canvas.current?.getBoundingClientRect();
    if (!rect) return null;
    const share = (clientX - rect.left - margin.left) / (width - margin.left - margin.right);
    return share < 0 || share > 1 ? null : props.x.min + share * (props.x.max - props.x.min);
  }

  return (
    <div ref={box} className="chart-box" aria-hidden="true" style={{ height }}>
      <canvas
        ref={canvas}
        onPointerMove={(event) => onHover?.(at(event.clientX))}
        onPointerLeave={() => onHover?.(null)}
        onClick={(event) => {
          const x = at(event.clientX);
          if (x !== null) onPick?.(x);
        }}
      />
    </div>
  );
}
