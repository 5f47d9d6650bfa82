// A block of equal rooms two deep, built from the demo house's constructions, glazing and schedules: a real
// project with all default physics, as large as one likes. Every room has a window to the south or north.

interface Side {
  readonly id: string;
  readonly azimuthDeg: number;
  readonly step: readonly [x: number, y: number];
  readonly opposite: string;
}

const sides: readonly Side[] = [
  { id: 'south', azimuthDeg: 180, step: [0, -1], opposite: 'north' },
  { id: 'north', azimuthDeg: 0, step: [0, 1], opposite: 'south' },
  { id: 'west', azimuthDeg: 270, step: [-1, 0], opposite: 'east' },
  { id: 'east', azimuthDeg: 90, step: [1, 0], opposite: 'west' },
];

const [lengthM, heightM] = [5, 2.6];

/**
 * @param houseText the demo house's project, for its libraries
 * @param across rooms along the front
 * @param storeys storeys of 2 · `across` rooms
 */
export function blockProject(houseText: string, across: number, storeys: number): string {
  const house = JSON.parse(houseText);
  const model = house.rooms[0];
  const idOf = (x: number, y: number, z: number) => `room-${x}-${y}-${z}`;
  const rooms = Array.from({ length: across * 2 * storeys }, (_, i) => {
    const [x, y, z] = [i % across, Math.floor(i / across) % 2, Math.floor(i / (2 * across))];
    const walls = sides.map((side) => {
      const [u, v] = [x + side.step[0], y + side.step[1]];
      const isInner = u >= 0 && u < across && v >= 0 && v < 2;
      const wall = {
        id: side.id,
        areaM2: lengthM * heightM,
        tiltDeg: 90,
        azimuthDeg: side.azimuthDeg,
      };
      if (isInner) {
        const boundary = { kind: 'room', room: idOf(u, v, z), surface: side.opposite };
        return { ...wall, construction: 'inner-wall', boundary };
      }
      const outer = {
        ...wall,
        construction: 'outer-wall',
        boundary: { kind: 'outdoors' },
        heightAboveGroundM: (z + 0.5) * heightM,
      };
      if (side.id !== 'south' && side.id !== 'north') return outer;
      const rectangle = { leftM: 1.5, bottomM: 0.9, widthM: 2, heightM: 1.4 };
      return {
        ...outer,
        openings: [
          { id: 'window', name: 'window', glazing: 'double-clear', areaM2: 2.8, rectangle },
        ],
      };
    });
    const flat = { areaM2: lengthM * lengthM, azimuthDeg: 0 };
    const floor = model.surfaces.find((s: { id: string }) => s.id === 'floor');
    const below =
      z === 0
        ? { ...floor, id: 'floor', areaM2: flat.areaM2 }
        : {
            ...flat,
            id: 'floor',
            construction: 'storey-floor',
            tiltDeg: 180,
            boundary: { kind: 'room', room: idOf(x, y, z - 1), surface: 'ceiling' },
          };
    const above =
      z === storeys - 1
        ? {
            ...flat,
            id: 'roof',
            construction: 'roof',
            tiltDeg: 0,
            boundary: { kind: 'outdoors' },
            heightAboveGroundM: storeys * heightM,
          }
        : {
            ...flat,
            id: 'ceiling',
            construction: 'storey-floor',
            tiltDeg: 0,
            boundary: { kind: 'room', room: idOf(x, y, z + 1), surface: 'floor' },
            reversed: true,
          };
    return {
      ...model,
      id: idOf(x, y, z),
      name: `Room ${i + 1}`,
      floorAreaM2: flat.areaM2,
      volumeM3: flat.areaM2 * heightM,
      box: { lengthM, depthM: lengthM, heightM, frontAzimuthDeg: 180 },
      surfaces: [...walls, below, above],
    };
  });
  const { airExchanges: _, options: __, weather: ___, ...libraries } = house;
  return JSON.stringify({ ...libraries, name: `Block of ${rooms.length} rooms`, rooms });
}
