// What a new project starts from: one empty room that runs as soon as a weather table is read. Its
// fabric comes from the generic library by id, so that the file stays short.

import type { ProjectForm, SurfaceForm } from './form.ts';

const lengthM = 5;
const depthM = 4;
const heightM = 2.6;

function wall(id: string, azimuthDeg: number, widthM: number): SurfaceForm {
  return {
    id,
    construction: 'wall-render-eps-160',
    areaM2: widthM * heightM,
    tiltDeg: 90,
    azimuthDeg,
    boundary: { kind: 'outdoors' },
  };
}

/** One room of 5 m by 4 m, 2.6 m high, with a window to the south, heated to 20 °C. */
export function emptyProject(name: string): ProjectForm {
  return {
    format: 'inglenook-project',
    version: 1,
    name,
    rooms: [
      {
        id: 'room',
        name: 'Room',
        floorAreaM2: lengthM * depthM,
        volumeM3: lengthM * depthM * heightM,
        box: { lengthM, depthM, heightM, frontAzimuthDeg: 180 },
        surfaces: [
          {
            ...wall('south', 180, lengthM),
            openings: [
              {
                id: 'window',
                name: 'Window',
                glazing: 'double-warm-argon',
                areaM2: 2.1,
                rectangle: { leftM: 1.75, bottomM: 0.9, widthM: 1.5, heightM: 1.4 },
              },
            ],
          },
          wall('west', 270, depthM),
          wall('north', 0, lengthM),
          wall('east', 90, depthM),
          {
            id: 'roof',
            construction: 'roof-flat-timber',
            areaM2: lengthM * depthM,
            tiltDeg: 0,
            boundary: { kind: 'outdoors' },
          },
          {
            id: 'floor',
            construction: 'ground-slab-80',
            areaM2: lengthM * depthM,
            tiltDeg: 180,
            boundary: { kind: 'ground', temperatureC: 10 },
          },
        ],
        infiltration: { airChangesPerH: 0.5 },
        heating: { setPointC: 20 },
        comfort: { bandLowC: 19, bandHighC: 26 },
      },
    ],
  };
}
