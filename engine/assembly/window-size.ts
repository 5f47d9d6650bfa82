// How an opening is shared out between glass, frame and glass edge (ISO 10077-1).
import type { Opening, Rectangle } from '../building/index.ts';
import { windowParts } from '../physics/index.ts';

export interface WindowSize {
  readonly glassAreaM2: number;
  readonly frameAreaM2: number;
  /** Visible edge of the glass. */
  readonly edgeLengthM: number;
  /** The glass as one rectangle in the middle of the opening's, of the glass's area. */
  readonly rectangle: Rectangle | undefined;
}

/**
 * Areas and edge of an opening. A frame given by its share leaves glass of the opening's proportions,
 * or a square where no rectangle is given, with the edge all round; `edgeLengthM` comes before both.
 */
export function windowSize(opening: Opening): WindowSize {
  const { areaM2, frame, rectangle } = opening;
  if (!frame) return { glassAreaM2: areaM2, frameAreaM2: 0, edgeLengthM: 0, rectangle };
  if (frame.widthM !== undefined && rectangle) {
    const parts = windowParts(rectangle.widthM, rectangle.heightM, frame.widthM, frame.panes);
    const scale = areaM2 / parts.windowAreaM2; // drawings round
    const glassAreaM2 = parts.glassAreaM2 * scale;
    return {
      glassAreaM2,
      frameAreaM2: areaM2 - glassAreaM2,
      edgeLengthM: frame.edgeLengthM ?? parts.edgeLengthM,
      rectangle: shrunk(rectangle, Math.sqrt(parts.glassAreaM2 / parts.windowAreaM2)),
    };
  }
  const share = frame.share ?? 0;
  const glassAreaM2 = areaM2 * (1 - share);
  const factor = Math.sqrt(1 - share);
  const perimeterM = rectangle
    ? 2 * (rectangle.widthM + rectangle.heightM) * factor
    : 4 * Math.sqrt(glassAreaM2);
  return {
    glassAreaM2,
    frameAreaM2: areaM2 - glassAreaM2,
    edgeLengthM: frame.edgeLengthM ?? perimeterM,
    rectangle: rectangle && shrunk(rectangle, factor),
  };
}

function shrunk({ leftM, bottomM, widthM, heightM }: Rectangle, factor: number): Rectangle {
  return {
    leftM: leftM + ((1 - factor) / 2) * widthM,
    bottomM: bottomM + ((1 - factor) / 2) * heightM,
    widthM: widthM * factor,
    heightM: heightM * factor,
  };
}
