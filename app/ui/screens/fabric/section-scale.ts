// Where each layer of a section is drawn: true to thickness, with a fixed strip for layers that only
// resist, and the measured edge in units of 10, 20, 50 or 100 mm.

import { edgeBars, evenUnits } from '../../chart/measured-edge.ts';

export interface LayerPlace {
  readonly x: number;
  readonly width: number;
}

const marginLeft = 118;
const marginRight = 92;
/** Width of a layer without thickness [px]. */
const stripPx = 16;
const leastMarkPx = 44;
const unitsM = [0.01, 0.02, 0.05, 0.1, 0.2, 0.5, 1];

export function sectionScale(layers: readonly { readonly thicknessM: number }[], width: number) {
  const strips = layers.filter((layer) => layer.thicknessM === 0).length;
  const whole = layers.reduce((sum, layer) => sum + layer.thicknessM, 0);
  const room = Math.max(80, width - marginLeft - marginRight - strips * stripPx);
  // Whole steps, so that the drawing does not swim while a handle moves.
  const shownM = whole > 0 ? Math.max(0.05, Math.ceil((whole * 1.04) / 0.05) * 0.05) : 0.05;
  const pxPerM = room / shownM;
  const places: LayerPlace[] = [];
  let x = marginLeft;
  for (const { thicknessM } of layers) {
    const layerWidth = thicknessM === 0 ? stripPx : thicknessM * pxPerM;
    places.push({ x, width: layerWidth });
    x += layerWidth;
  }
  const right = x;
  // The edge measures the drawing from the outer face on; strips have no measure.
  const endM = (right - marginLeft) / pxPerM;
  const unit = unitsM.find((one) => one * pxPerM >= 9) ?? 1;
  const edge = strips > 0 ? [] : edgeBars(evenUnits(0, endM, unit), (m) => marginLeft + m * pxPerM);
  const mark = unitsM.find((one) => one * pxPerM >= leastMarkPx) ?? 1;
  const marks: { x: number; label: string }[] = [];
  if (strips === 0) {
    for (let m = 0; m <= endM + 1e-9; m += mark) {
      const label = String(Math.round(m * 1000));
      marks.push({ x: marginLeft + m * pxPerM, label: m === 0 ? '0 mm' : label });
    }
  }
  return { left: marginLeft, right, pxPerM, places, edge, marks };
}
