// How the faces of a room exchange heat with its air and with each other.
import type { Building, Room } from '../building/index.ts';
import {
  blendedFilmWPerM2K,
  fixedFilm,
  greyExchangeAreasM2,
  starExchangeAreasM2,
  thirdPowerFilm,
} from '../physics/index.ts';
import type { FaceViews } from './enclosure.ts';
import type { FlowRef, NetworkBuilder, Provenance } from './network-builder.ts';
import type { Face } from './room-parts.ts';

const methods = {
  walton:
    'natural convection, one-third power by tilt and direction (ASHRAE Handbook, Walton 1983)',
  'alamdari-hammond': 'natural convection, Alamdari & Hammond 1983',
  'iso-6946': 'fixed convection coefficients of ISO 6946, Annex C',
};

/** The film between one face and the room's air; positive flow from face to air. */
export function addInsideFilm(
  building: Building,
  room: Room,
  face: Face,
  airNode: number,
  builder: NetworkBuilder,
): FlowRef {
  const method = building.physics.insideConvection;
  const faceTiltDeg = 180 - face.tiltDeg;
  const { areaM2 } = face;
  const about: Provenance = {
    name: `${face.name} film`,
    room: room.id,
    surface: face.surface,
    what: 'inside convection',
    method: methods[method],
    inputs: { areaM2, faceTiltDeg },
  };
  if (method === 'walton') {
    const film = thirdPowerFilm(faceTiltDeg);
    return builder.buoyantLink(
      face.node,
      airNode,
      film.warmerFace * areaM2,
      film.coolerFace * areaM2,
      about,
    );
  }
  if (method === 'iso-6946') {
    const film = fixedFilm(faceTiltDeg);
    if (film.warmerFace === film.coolerFace)
      return builder.constantLink(face.node, airNode, film.warmerFace * areaM2, about);
    return builder.functionLink(
      face.node,
      airNode,
      (faceC, airC) => areaM2 * (faceC > airC ? film.warmerFace : film.coolerFace),
      about,
    );
  }
  const heightM = room.box?.heightM ?? room.volumeM3 / room.floorAreaM2;
  const diameterM = Math.sqrt(room.floorAreaM2); // four times area over perimeter of a square floor
  return builder.functionLink(
    face.node,
    airNode,
    (faceC, airC) => areaM2 * blendedFilmWPerM2K(faceTiltDeg, faceC - airC, heightM, diameterM),
    about,
  );
}

/** Long-wave exchange of all faces; gives the enclosure's index. */
export function addInsideLongWave(
  building: Building,
  room: Room,
  faces: readonly Face[],
  views: FaceViews,
  builder: NetworkBuilder,
): number {
  const emissivity = faces.map((face) => (face.radiantNode === undefined ? face.emissivity : 1));
  const exchangeAreaM2 =
    building.physics.insideLongWave === 'grey-enclosure'
      ? greyExchangeAreasM2(views.areaM2, views.exchangeM2, emissivity)
      : starExchangeAreasM2(views.areaM2, emissivity);
  return builder.enclosure({
    name: room.id,
    nodes: Int32Array.from(faces, (face) => face.radiantNode ?? face.node),
    exchangeAreaM2,
  });
}
