// Natural convection between a room's surface and its air, as coefficients of h = c·|ΔT|^n.
//
// A surface is described by the tilt of the face that touches the air: 0 faces up (a floor seen from
// its room), 90 upright, 180 faces down (a ceiling). A warm face turned up and a cold face turned
// down set the air moving; the other two hold a stable layer. Forced flow is not in these formulas:
// fans and supply jets raise the film above what they say.

/** Coefficients of h = c·|ΔT|^n for a face warmer than its air, and for one cooler. */
export interface PowerLawFilm {
  /** W/(m²·K) per K^n, face warmer than the air. */
  readonly warmerFace: number;
  /** W/(m²·K) per K^n, face cooler than the air. */
  readonly coolerFace: number;
  readonly exponent: number;
}

/** Vertical face. 0.19 Btu/(h·ft²·°F) per °F^(1/3) in the Handbook. */
const verticalWPerM2K = 1.31;
/** Horizontal face, heat flow that stirs the air (warm floor, cold ceiling). */
const stirredWPerM2K = 1.51;
/** Horizontal face, heat flow that keeps the air in layers (cold floor, warm ceiling). */
const layeredWPerM2K = 0.76;

const radPerDeg = Math.PI / 180;

/**
 * Turbulent natural convection at a face of any tilt.
 *
 *   upright        h = 1.31·|ΔT|^(1/3)
 *   flat, stirred  h = 1.51·|ΔT|^(1/3)       flat, layered  h = 0.76·|ΔT|^(1/3)
 *   tilted, stirred  h = 9.482·|ΔT|^(1/3)/(7.238 − |cos β|)
 *   tilted, layered  h = 1.810·|ΔT|^(1/3)/(1.382 + |cos β|)
 *
 * The tilted forms meet the upright one exactly and the flat ones within 0.7 %. Meant for faces of
 * room size; too high for small ones and for |ΔT| well under 1 K, where the flow is laminar.
 *
 * @param faceTiltDeg tilt of the face that touches the air, 0 faces up, 180 faces down [°]
 *
 * Source: ASHRAE Handbook of Fundamentals, natural convection table; G. N. Walton, "Thermal analysis
 * research program reference manual", NBSIR 83-2655, National Bureau of Standards, 1983 (constants
 * from memory; 7.283 in place of 7.238 is also seen in print).
 */
export function thirdPowerFilm(faceTiltDeg: number): PowerLawFilm {
  const cosine = Math.cos(faceTiltDeg * radPerDeg);
  const steep = Math.abs(cosine);
  const flat = steep > 0.99985; // within 1° of horizontal
  const upright = steep < 1e-12;
  const stirred = flat ? stirredWPerM2K : upright ? verticalWPerM2K : 9.482 / (7.238 - steep);
  const layered = flat ? layeredWPerM2K : upright ? verticalWPerM2K : 1.81 / (1.382 + steep);
  const facesUp = cosine > 0;
  return {
    warmerFace: facesUp ? stirred : layered,
    coolerFace: facesUp ? layered : stirred,
    exponent: 1 / 3,
  };
}

/** Joins the laminar and the turbulent branch smoothly: sixth root of the sum of sixth powers. */
function blend(laminar: number, turbulent: number): number {
  return (laminar ** 6 + turbulent ** 6) ** (1 / 6);
}

/**
 * Natural convection at an upright face, laminar to turbulent.
 *
 *   h = { [1.50·(ΔT/H)^(1/4)]⁶ + [1.23·ΔT^(1/3)]⁶ }^(1/6)
 *
 * @param differenceK face to air, sign without meaning [K]
 * @param heightM height of the face [m]
 * @returns film coefficient [W/(m²·K)]
 *
 * Source: F. Alamdari, G. P. Hammond, "Improved data correlations for buoyancy-driven convection in
 * rooms", Building Services Engineering Research & Technology 4 (1983), pp. 106–112 (constants from
 * memory).
 */
export function verticalFaceWPerM2K(differenceK: number, heightM: number): number {
  const d = Math.abs(differenceK);
  return blend(1.5 * (d / heightM) ** 0.25, 1.23 * d ** (1 / 3));
}

/**
 * Natural convection at a flat face whose heat stirs the air (warm floor, cold ceiling).
 *
 *   h = { [1.40·(ΔT/D)^(1/4)]⁶ + [1.63·ΔT^(1/3)]⁶ }^(1/6)
 *
 * @param hydraulicDiameterM four times area over perimeter [m]
 *
 * Source: Alamdari & Hammond 1983, as above.
 */
export function stirredFaceWPerM2K(differenceK: number, hydraulicDiameterM: number): number {
  const d = Math.abs(differenceK);
  return blend(1.4 * (d / hydraulicDiameterM) ** 0.25, 1.63 * d ** (1 / 3));
}

/**
 * Natural convection at a flat face under a stable layer (cold floor, warm ceiling).
 *
 *   h = 0.60·(ΔT/D²)^(1/5)
 *
 * @param hydraulicDiameterM four times area over perimeter [m]
 *
 * Source: Alamdari & Hammond 1983, as above.
 */
export function layeredFaceWPerM2K(differenceK: number, hydraulicDiameterM: number): number {
  return 0.6 * (Math.abs(differenceK) / hydraulicDiameterM ** 2) ** 0.2;
}

/**
 * Film of Alamdari & Hammond for a face of any tilt: flat under 45° from horizontal, upright else.
 * The switch at 45° is our choice; the source gives the three positions only.
 *
 * @param faceTiltDeg tilt of the face that touches the air, 0 faces up, 180 faces down [°]
 * @param faceMinusAirK temperature of the face less that of the air [K]
 * @param heightM height of the face, for an upright one [m]
 * @param hydraulicDiameterM four times area over perimeter, for a flat one [m]
 */
export function blendedFilmWPerM2K(
  faceTiltDeg: number,
  faceMinusAirK: number,
  heightM: number,
  hydraulicDiameterM: number,
): number {
  if (faceTiltDeg >= 45 && faceTiltDeg <= 135) return verticalFaceWPerM2K(faceMinusAirK, heightM);
  const facesUp = faceTiltDeg < 90;
  const stirs = facesUp ? faceMinusAirK > 0 : faceMinusAirK < 0;
  return stirs
    ? stirredFaceWPerM2K(faceMinusAirK, hydraulicDiameterM)
    : layeredFaceWPerM2K(faceMinusAirK, hydraulicDiameterM);
}

/**
 * Fixed convection coefficients: 2.5 sideways, 5.0 heat flow up, 0.7 heat flow down [W/(m²·K)].
 * Sideways holds where the heat flow is within 30° of horizontal, that is, for tilts of 60° to 120°.
 *
 * @param faceTiltDeg tilt of the face that touches the air, 0 faces up, 180 faces down [°]
 *
 * Source: ISO 6946:2017, Annex C.
 */
export function fixedFilm(faceTiltDeg: number): PowerLawFilm {
  if (faceTiltDeg >= 60 && faceTiltDeg <= 120)
    return { warmerFace: 2.5, coolerFace: 2.5, exponent: 0 };
  const facesUp = faceTiltDeg < 90;
  return { warmerFace: facesUp ? 5 : 0.7, coolerFace: facesUp ? 0.7 : 5, exponent: 0 };
}
