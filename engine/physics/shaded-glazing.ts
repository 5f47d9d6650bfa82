// A glazing with a blind before, in or behind it: light by all orders of reflection between panes and
// a layer that scatters.
//
// The blind lets a share through its holes as it came (openness); what else it passes and throws back
// is even in all directions. Panes on either side are taken as one stack each, with their own values
// for a beam at each angle and for even light, so that a stack with nothing before it loses no accuracy.
import type { PaneStack } from './pane-stack.ts';

/** A blind as a layer. */
export interface ScatteringLayer {
  /** Of all light, holes included, 0 to 1. */
  readonly transmittance: number;
  /** Share that goes through holes unchanged, at most `transmittance`. */
  readonly openness: number;
  readonly frontReflectance: number;
  readonly backReflectance: number;
}

/** Optics by angle of the whole, for light from outdoors, and for even light both ways. */
export interface LayeredAngles {
  /** Panes, and the blind in its place, outermost first. */
  readonly layerCount: number;
  /** Passed as a beam, at k degrees of incidence. */
  readonly transmittance: Float64Array;
  /** Passed scattered; absent where nothing scatters. */
  readonly scattered?: Float64Array;
  /** Layer l at k degrees is `absorptance[k * layerCount + l]`. */
  readonly absorptance: Float64Array;
  readonly diffuse: LayeredShares;
  readonly diffuseFromInside: LayeredShares;
}

/** Together 1. */
export interface LayeredShares {
  readonly transmittance: number;
  readonly reflectance: number;
  readonly absorptance: Float64Array;
}

/**
 * Optics of [panes] – blind – [panes]; either side may be empty.
 *
 * Beam before the blind b = τ_F/(1 − ρ_F'·o²·ρ_R): the holes o are the only way back for a beam. What
 * is not passed by holes is scattered, (τ − o)·b onwards and ρ·b back; scattered light then goes to and
 * fro between the two stacks and the blind. Polarisation is averaged in each stack.
 *
 * Source: net radiation between layers as in ISO 15099:2003, 7.4 (direct and diffuse streams through
 * a layer with scattering); one hole share for all angles is our simplification.
 */
export function layeredAngles(
  front: PaneStack,
  blind: ScatteringLayer,
  rear: PaneStack,
): LayeredAngles {
  const layerCount = front.paneCount + 1 + rear.paneCount;
  const transmittance = new Float64Array(91);
  const scattered = new Float64Array(91);
  const absorptance = new Float64Array(91 * layerCount);
  const { openness: o } = blind;
  const passed = blind.transmittance - o;
  for (let k = 0; k < 90; k++) {
    const f = front.beam[k];
    const fBack = front.beamFromBehind[k];
    const r = rear.beam[k];
    const before = f.transmittance / (1 - fBack.reflectance * o * o * r.reflectance);
    const after = o * before;
    const returning = r.reflectance * after; // at the blind's back, as a beam
    const back = o * returning; // at the front stack's back, as a beam
    const even = diffuseBetween(front, blind, rear, {
      towardsFront: blind.frontReflectance * before + passed * returning,
      towardsRear: passed * before + blind.backReflectance * returning,
    });
    transmittance[k] = r.transmittance * after;
    scattered[k] = even.transmitted;
    const at = k * layerCount;
    for (let p = 0; p < front.paneCount; p++)
      absorptance[at + p] =
        f.absorptance[p] +
        fBack.absorptance[p] * back +
        even.inFront * front.even.back.absorptance[p];
    absorptance[at + front.paneCount] =
      (1 - blind.transmittance - blind.frontReflectance) * (before + even.onFront) +
      (1 - blind.transmittance - blind.backReflectance) * (returning + even.onBack);
    for (let p = 0; p < rear.paneCount; p++)
      absorptance[at + front.paneCount + 1 + p] =
        r.absorptance[p] * after + even.inRear * rear.even.front.absorptance[p];
  }
  return {
    layerCount,
    transmittance,
    scattered,
    absorptance,
    diffuse: evenShares(front, blind, rear),
    diffuseFromInside: mirrored(evenShares(turned(rear), turnedBlind(blind), turned(front))),
  };
}

/** Shares of even light from the front. */
function evenShares(front: PaneStack, blind: ScatteringLayer, rear: PaneStack): LayeredShares {
  const entering = front.even.front.transmittance;
  const even = diffuseBetween(front, blind, rear, {
    towardsFront: blind.frontReflectance * entering,
    towardsRear: blind.transmittance * entering,
  });
  const { paneCount } = front;
  const absorptance = new Float64Array(paneCount + 1 + rear.paneCount);
  for (let p = 0; p < paneCount; p++)
    absorptance[p] =
      front.even.front.absorptance[p] + even.inFront * front.even.back.absorptance[p];
  absorptance[paneCount] =
    (1 - blind.transmittance - blind.frontReflectance) * (entering + even.onFront) +
    (1 - blind.transmittance - blind.backReflectance) * even.onBack;
  for (let p = 0; p < rear.paneCount; p++)
    absorptance[paneCount + 1 + p] = even.inRear * rear.even.front.absorptance[p];
  return {
    transmittance: even.transmitted,
    reflectance: front.even.front.reflectance + even.inFront * front.even.back.transmittance,
    absorptance,
  };
}

function turned(stack: PaneStack): PaneStack {
  const swap = (s: LayeredShares): LayeredShares => ({
    ...s,
    absorptance: s.absorptance.slice().reverse(),
  });
  return {
    ...stack,
    even: { front: swap(stack.even.back), back: swap(stack.even.front) },
  };
}

function turnedBlind(blind: ScatteringLayer): ScatteringLayer {
  return {
    ...blind,
    frontReflectance: blind.backReflectance,
    backReflectance: blind.frontReflectance,
  };
}

function mirrored(shares: LayeredShares): LayeredShares {
  return { ...shares, absorptance: shares.absorptance.slice().reverse() };
}

/** Where scattered light ends up, for 1 of light that met the glazing. */
interface EvenLight {
  /** That meets the back of the front stack, and the front of the rear stack. */
  readonly inFront: number;
  readonly inRear: number;
  /** That meets the blind again, on either face. */
  readonly onFront: number;
  readonly onBack: number;
  readonly transmitted: number;
}

/**
 * Even light between two stacks and the blind, from what the blind sends out first.
 *
 *   v = s_F + ρ_f·(ρ_F·v) + τ·(ρ_R·w),  w = s_R + τ·(ρ_F·v) + ρ_b·(ρ_R·w)
 *
 * v and w leave the blind towards the front and the rear stack.
 */
function diffuseBetween(
  front: PaneStack,
  blind: ScatteringLayer,
  rear: PaneStack,
  first: { readonly towardsFront: number; readonly towardsRear: number },
): EvenLight {
  const f = front.even.back.reflectance;
  const r = rear.even.front.reflectance;
  const { transmittance: t, frontReflectance, backReflectance } = blind;
  const a = 1 - frontReflectance * f;
  const b = t * r;
  const c = t * f;
  const d = 1 - backReflectance * r;
  const determinant = a * d - b * c;
  const v = (d * first.towardsFront + b * first.towardsRear) / determinant;
  const w = (c * first.towardsFront + a * first.towardsRear) / determinant;
  return {
    inFront: v,
    inRear: w,
    onFront: f * v,
    onBack: r * w,
    transmitted: rear.even.front.transmittance * w,
  };
}
