// Local discomfort where the run knows enough: draught by the air speed given, the floor's temperature,
// and radiation from one side in a room that is a box.
import type { Face } from '../assembly/index.ts';
import { type Box, boxFaceOf, type LocalComfort, type Room } from '../building/index.ts';
import {
  type AsymmetryKind,
  dissatisfiedByAsymmetry,
  dissatisfiedByFloor,
  draughtRate,
} from '../physics/index.ts';
import { type ElementView, elementView } from './half-space.ts';

/** Largest asymmetry of one kind in occupied hours. */
export interface AsymmetryFindings {
  readonly kind: AsymmetryKind;
  readonly greatestK: number;
  readonly dissatisfied: number;
  /** Limit of category B, and occupied hours above it. */
  readonly limitK: number;
  readonly hoursAboveLimit: number;
}

export interface LocalFindings {
  readonly method: string;
  /** Greatest share of people dissatisfied by draught, and occupied hours above 20 % (category B). */
  readonly draught: { readonly greatest: number; readonly hoursAboveLimit: number };
  /** Null in a room without a floor. */
  readonly floor: {
    readonly minC: number;
    readonly maxC: number;
    readonly greatest: number;
    /** Occupied hours outside 19 to 29 °C (category B, 10 %). */
    readonly hoursOutsideLimit: number;
  } | null;
  /** Null in a room that is no box. */
  readonly asymmetry: readonly AsymmetryFindings[] | null;
}

/** Source: ISO 7730:2005, Table A.4, category B (from memory). */
const asymmetryLimitK: Readonly<Record<AsymmetryKind, number>> = {
  'warm ceiling': 5,
  'cool wall': 10,
  'cool ceiling': 14,
  'warm wall': 23,
};
const draughtLimit = 0.2; // ISO 7730:2005, Table A.1, category B
const floorLimitC = [19, 29] as const; // ISO 7730:2005, Table A.3, category B

export interface LocalHours {
  readonly airC: Float64Array;
  readonly occupied: Uint8Array;
  readonly faces: readonly Face[];
  /** Hourly mean temperature of each face. */
  readonly faceC: readonly Float64Array[];
}

export function localFindings(
  room: Room,
  comfort: LocalComfort,
  hours: LocalHours,
): LocalFindings | null {
  if (!hours.occupied.includes(1)) return null;
  return {
    method: 'ISO 7730:2005, clause 6; category B of Annex A',
    draught: draught(comfort, hours),
    floor: floor(hours),
    asymmetry: room.box ? asymmetry(room, room.box, comfort, hours) : null,
  };
}

function draught(comfort: LocalComfort, { airC, occupied }: LocalHours): LocalFindings['draught'] {
  let greatest = 0;
  let hoursAboveLimit = 0;
  for (let h = 0; h < airC.length; h++) {
    if (occupied[h] === 0) continue;
    const rate = draughtRate(airC[h], comfort.airMPerS, comfort.turbulence);
    greatest = Math.max(greatest, rate);
    if (rate > draughtLimit) hoursAboveLimit++;
  }
  return { greatest, hoursAboveLimit };
}

function floor({ occupied, faces, faceC }: LocalHours): LocalFindings['floor'] {
  const floors = faces.flatMap((face, f) => (face.tiltDeg > 135 ? [{ face, c: faceC[f] }] : []));
  if (floors.length === 0) return null;
  const area = floors.reduce((sum, { face }) => sum + face.areaM2, 0);
  let minC = Number.POSITIVE_INFINITY;
  let maxC = Number.NEGATIVE_INFINITY;
  let hoursOutsideLimit = 0;
  for (let h = 0; h < occupied.length; h++) {
    if (occupied[h] === 0) continue;
    const floorC = floors.reduce((sum, { face, c }) => sum + (face.areaM2 * c[h]) / area, 0);
    minC = Math.min(minC, floorC);
    maxC = Math.max(maxC, floorC);
    if (floorC < floorLimitC[0] || floorC > floorLimitC[1]) hoursOutsideLimit++;
  }
  const greatest = Math.max(dissatisfiedByFloor(minC), dissatisfiedByFloor(maxC));
  return { minC, maxC, greatest, hoursOutsideLimit };
}

/** Box faces in the order of `boxFaceOf`: front, left, back, right, floor, ceiling. */
type SixC = [number, number, number, number, number, number];
const [front, left, back, right, ground, ceiling] = [0, 1, 2, 3, 4, 5] as const;

/** Weight of each box face in what the element sees one way less what it sees the other way. */
type Difference = SixC;

/**
 * Radiant temperature asymmetry in the middle of the plan, at the height of the person: plane radiant
 * temperatures of the two half spaces, faces black and each at its mean temperature.
 *
 * Source: ISO 7726:1998, Annex C.
 */
function asymmetry(
  room: Room,
  box: Box,
  comfort: LocalComfort,
  { airC, occupied, faces, faceC }: LocalHours,
): AsymmetryFindings[] {
  const place = faces.map((face) => {
    const surface = room.surfaces.find((one) => one.id === face.surface);
    return surface ? (boxFaceOf(box, surface) ?? -1) : -1;
  });
  const area: SixC = [0, 0, 0, 0, 0, 0];
  place.forEach((p, f) => {
    if (p >= 0) area[p] += faces[f].areaM2;
  });
  const [upDown, frontBack, leftRight] = differences(box, comfort.heightM);
  const greatestK = new Map<AsymmetryKind, number>();
  const hoursAbove = new Map<AsymmetryKind, number>();
  const note = (kind: AsymmetryKind, k: number) => {
    greatestK.set(kind, Math.max(greatestK.get(kind) ?? 0, k));
    if (k > asymmetryLimitK[kind]) hoursAbove.set(kind, (hoursAbove.get(kind) ?? 0) + 1);
  };
  const meanC: SixC = [0, 0, 0, 0, 0, 0];
  for (let h = 0; h < occupied.length; h++) {
    if (occupied[h] === 0) continue;
    meanC.fill(0);
    place.forEach((p, f) => {
      if (p >= 0) meanC[p] += (faces[f].areaM2 * faceC[f][h]) / area[p];
    });
    const up = dot(upDown, meanC);
    note(up > 0 ? 'warm ceiling' : 'cool ceiling', Math.abs(up));
    for (const [difference, a, b] of [
      [frontBack, front, back],
      [leftRight, left, right],
    ] as const)
      note(wallKind(meanC[a], meanC[b], airC[h]), Math.abs(dot(difference, meanC)));
  }
  return [...greatestK].map(([kind, k]) => ({
    kind,
    greatestK: k,
    dissatisfied: dissatisfiedByAsymmetry(kind, k),
    limitK: asymmetryLimitK[kind],
    hoursAboveLimit: hoursAbove.get(kind) ?? 0,
  }));
}

/** The wall that lies further from the air gives its name to the asymmetry (own rule). */
function wallKind(aC: number, bC: number, airC: number): AsymmetryKind {
  return Math.max(aC, bC) - airC > airC - Math.min(aC, bC) ? 'warm wall' : 'cool wall';
}

const dot = (weight: SixC, c: SixC): number => weight.reduce((sum, w, i) => sum + w * c[i], 0);

/** Up less down, front less back, left less right. */
export function differences(box: Box, heightM: number): [Difference, Difference, Difference] {
  const { lengthM, depthM, heightM: roomM } = box;
  const atM = Math.min(heightM, 0.95 * roomM);
  const [halfL, halfD] = [lengthM / 2, depthM / 2];
  const flat = (aheadM: number) =>
    elementView({ aheadM, leftM: halfL, rightM: halfL, upM: halfD, downM: halfD });
  const walls = (view: ElementView, sign: number, into: SixC) => {
    into[left] += sign * view.left;
    into[right] += sign * view.right;
    into[front] += sign * view.up;
    into[back] += sign * view.down;
  };
  const upDown: SixC = [0, 0, 0, 0, 0, 0];
  const [above, below] = [flat(roomM - atM), flat(atM)];
  upDown[ceiling] = above.ahead;
  upDown[ground] = -below.ahead;
  walls(above, 1, upDown);
  walls(below, -1, upDown);
  // Looking at a wall from the middle, both sides see the same of the other four faces.
  const ahead = (aheadM: number, besideM: number) =>
    elementView({
      aheadM,
      leftM: besideM,
      rightM: besideM,
      upM: roomM - atM,
      downM: atM,
    }).ahead;
  const frontBack: SixC = [0, 0, 0, 0, 0, 0];
  frontBack[front] = ahead(halfD, halfL);
  frontBack[back] = -frontBack[front];
  const leftRight: SixC = [0, 0, 0, 0, 0, 0];
  leftRight[left] = ahead(halfL, halfD);
  leftRight[right] = -leftRight[left];
  return [upDown, frontBack, leftRight];
}
