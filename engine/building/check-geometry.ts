// Sizes that cannot be: openings larger than their wall, partitions whose two faces differ, boxes
// whose faces do not match the surfaces, glass stacks without their gaps.
import type { Fault } from '../../weather/index.ts';
import { boxFaceAreasM2, boxFaceOf } from './box-face.ts';
import { constructionOf } from './find.ts';
import type { Building } from './schema-project.ts';
import type { Room, Surface } from './schema-room.ts';

type Add = (path: string, found: string, expected: string, mend: string) => void;

const areaToleranceShare = 0.01; // drawings round to centimetres

/** Every size in the building that contradicts another. References must be sound already. */
export function geometryFaults(building: Building, file: string): Fault[] {
  const faults: Fault[] = [];
  const add: Add = (path, found, expected, mend) =>
    faults.push({ file, place: { path }, found, expected, mend });
  building.glazings.forEach((glazing, i) => {
    if (glazing.kind === 'simple') return;
    if (glazing.gaps.length !== glazing.panes.length - 1)
      add(
        `glazings[${i}].gaps`,
        `${glazing.gaps.length} gaps with ${glazing.panes.length} panes`,
        `${glazing.panes.length - 1} gaps`,
        'There is one gap between each two panes.',
      );
    glazing.panes.forEach((pane, j) => {
      for (const side of ['frontSolarReflectance', 'backSolarReflectance'] as const) {
        const reflectance = pane[side] ?? 0;
        if (pane.solarTransmittance + reflectance > 1)
          add(
            `glazings[${i}].panes[${j}]`,
            `solarTransmittance ${pane.solarTransmittance} and ${side} ${reflectance}`,
            'a sum of at most 1',
            'What is let through and what is thrown back cannot exceed what comes in.',
          );
      }
    });
  });
  building.profiles.forEach((profile, i) => {
    if (profile.kind !== 'points') return;
    profile.points.forEach((point, j) => {
      if (j > 0 && point.atH < profile.points[j - 1].atH)
        add(
          `profiles[${i}].points[${j}].atH`,
          `${point.atH}`,
          `${profile.points[j - 1].atH} or later`,
          'Put the points in order of time.',
        );
    });
  });
  building.rooms.forEach((room, i) => {
    const path = `rooms[${i}]`;
    room.surfaces.forEach((surface, j) => {
      surfaceFaults(building, room, surface, `${path}.surfaces[${j}]`, add);
    });
    if (room.box) boxFaults(room, path, add);
    if (
      room.comfort &&
      typeof room.comfort.bandLowC === 'number' &&
      typeof room.comfort.bandHighC === 'number' &&
      room.comfort.bandLowC >= room.comfort.bandHighC
    )
      add(
        `${path}.comfort.bandHighC`,
        `${room.comfort.bandHighC}`,
        `more than bandLowC, ${room.comfort.bandLowC}`,
        'Set the upper limit above the lower one.',
      );
    if (
      room.heating &&
      room.cooling &&
      typeof room.heating.setPointC === 'number' &&
      typeof room.cooling.setPointC === 'number' &&
      room.cooling.setPointC < room.heating.setPointC
    )
      add(
        `${path}.cooling.setPointC`,
        `${room.cooling.setPointC}`,
        `at least the heating set-point, ${room.heating.setPointC}`,
        'Heating and cooling would work against each other.',
      );
  });
  return faults;
}

function surfaceFaults(building: Building, room: Room, surface: Surface, path: string, add: Add) {
  const glass = surface.openings.reduce((sum, opening) => sum + opening.areaM2, 0);
  if (glass > surface.areaM2 * (1 + 1e-9))
    add(
      `${path}.openings`,
      `openings of ${round(glass)} m² together`,
      `at most the surface's ${round(surface.areaM2)} m²`,
      'Make the openings smaller or correct the area, which is gross.',
    );
  surface.openings.forEach((opening, k) => {
    const { rectangle } = opening;
    if (
      rectangle &&
      Math.abs(rectangle.widthM * rectangle.heightM - opening.areaM2) >
        areaToleranceShare * opening.areaM2
    )
      add(
        `${path}.openings[${k}].rectangle`,
        `${rectangle.widthM} m × ${rectangle.heightM} m`,
        `a size that gives areaM2, ${opening.areaM2}`,
        'Correct the area or the rectangle.',
      );
    if (surface.boundary.kind !== 'outdoors')
      add(
        `${path}.openings[${k}]`,
        `a glazed opening in a surface with boundary "${surface.boundary.kind}"`,
        'boundary "outdoors"',
        'Glazing is modelled in outside surfaces only.',
      );
  });
  const { boundary } = surface;
  if (boundary.kind !== 'room') {
    if (surface.reversed)
      add(
        `${path}.reversed`,
        'true',
        'false where the other side is no room',
        'Only a partition can be reversed; reorder the layers instead.',
      );
    return;
  }
  const other = building.rooms.find((one) => one.id === boundary.room);
  const behind = other?.surfaces.find((one) => one.id === boundary.surface);
  if (!other || !behind || room.id > other.id) return; // once a pair, in the order of ids
  if (behind.construction !== surface.construction)
    add(
      `${path}.construction`,
      `"${surface.construction}"`,
      `"${behind.construction}", as on its other face ${other.id}/${behind.id}`,
      'A partition has one construction.',
    );
  if (Math.abs(behind.areaM2 - surface.areaM2) > areaToleranceShare * surface.areaM2)
    add(
      `${path}.areaM2`,
      `${surface.areaM2}`,
      `${behind.areaM2}, as on its other face ${other.id}/${behind.id}`,
      'Both faces of a partition have the same area.',
    );
  if (Math.abs(behind.tiltDeg + surface.tiltDeg - 180) > 1)
    add(
      `${path}.tiltDeg`,
      `${surface.tiltDeg}`,
      `${180 - behind.tiltDeg}, the other way round than ${other.id}/${behind.id}`,
      'The two faces of a partition look in opposite directions.',
    );
  const { layers } = constructionOf(building, surface.construction);
  const symmetric = layers.every(
    (layer, j) => JSON.stringify(layer) === JSON.stringify(layers[layers.length - 1 - j]),
  );
  if (!symmetric && surface.reversed === behind.reversed)
    add(
      `${path}.reversed`,
      `${surface.reversed} on both faces`,
      `true on one of ${room.id}/${surface.id} and ${other.id}/${behind.id}`,
      'The layers are not the same both ways round: say which face sees them reversed.',
    );
}

function boxFaults(room: Room, path: string, add: Add) {
  const box = room.box;
  if (!box) return;
  const areas = boxFaceAreasM2(box);
  const held = areas.map(() => 0);
  room.surfaces.forEach((surface, j) => {
    const face = boxFaceOf(box, surface);
    if (face === undefined)
      add(
        `${path}.surfaces[${j}]`,
        `tilt ${surface.tiltDeg}°, azimuth ${surface.azimuthDeg}°`,
        `a face of the box, whose front looks to ${box.frontAzimuthDeg}°`,
        'Turn the surface, or leave out the box.',
      );
    else held[face] += surface.areaM2;
  });
  if (held.some((area, face) => Math.abs(area - areas[face]) > areaToleranceShare * areas[face]))
    add(
      `${path}.box`,
      `faces (front, left, back, right, floor, ceiling) of ${areas.map(round).join(', ')} m²`,
      `the surfaces' ${held.map(round).join(', ')} m²`,
      'The surfaces on each face add up to that face; correct the areas or leave out the box.',
    );
  if (
    Math.abs(box.lengthM * box.depthM * box.heightM - room.volumeM3) >
    areaToleranceShare * room.volumeM3
  )
    add(
      `${path}.volumeM3`,
      `${room.volumeM3}`,
      `${round(box.lengthM * box.depthM * box.heightM)}, as the box has`,
      'Correct the volume or the box.',
    );
}

const round = (value: number): number => Number(value.toPrecision(5));
