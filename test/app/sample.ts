// An invented one-room house for the tests of the app: a brick box with a window to the south.

const wall = (id: string, azimuthDeg: number, areaM2: number, more = {}) => ({
  id,
  construction: 'brick-wall',
  areaM2,
  tiltDeg: 90,
  azimuthDeg,
  boundary: { kind: 'outdoors' },
  ...more,
});

export const sampleProject = {
  format: 'inglenook-project',
  version: 1,
  name: 'Garden room',
  weather: { file: 'weather/year.csv' },
  materials: [
    {
      id: 'brick',
      name: 'Brick',
      conductivityWPerMK: 0.7,
      densityKgPerM3: 1700,
      specificHeatJPerKgK: 900,
    },
  ],
  constructions: [
    {
      id: 'brick-wall',
      name: 'Brick with insulation',
      layers: [
        { name: 'insulation', resistanceM2KPerW: 2 },
        { material: 'brick', thicknessM: 0.2 },
      ],
    },
  ],
  glazings: [{ id: 'pane', kind: 'simple', name: 'Double', uValueWPerM2K: 1.3, gValue: 0.6 }],
  rooms: [
    {
      id: 'room',
      name: 'Room',
      floorAreaM2: 20,
      volumeM3: 50,
      surfaces: [
        wall('south', 180, 12.5, { openings: [{ id: 'window', glazing: 'pane', areaM2: 3 }] }),
        wall('west', 270, 10),
        wall('north', 0, 12.5),
        wall('east', 90, 10),
        { ...wall('roof', 0, 20), tiltDeg: 0 },
        {
          ...wall('floor', 0, 20),
          tiltDeg: 180,
          boundary: { kind: 'ground', temperatureC: 10 },
        },
      ],
      gains: [{ id: 'people', kind: 'people', powerW: 80 }],
      infiltration: { airChangesPerH: 0.5 },
      heating: { setPointC: 20, maxW: 3000 },
      comfort: { bandLowC: 19, bandHighC: 26 },
    },
  ],
};

export const sampleText = (changes: object = {}) =>
  `${JSON.stringify({ ...sampleProject, ...changes }, null, 2)}\n`;

/** A plain weather table of an invented place: sinusoids for year and day, sun by day. */
export function sampleWeather(warmerK = 0): string {
  const lines = [
    '# site: Nowhere Moor',
    '# latitudeDeg: 50',
    '# longitudeDeg: 15',
    '# elevationM: 200',
    '# utcOffsetH: 1',
    '# year: 2019',
    'hour,dryBulbC,relativeHumidity,windMPerS,ghiWPerM2',
  ];
  for (let hour = 0; hour < 8760; hour++) {
    const yearTurn = -Math.cos((2 * Math.PI * (hour - 20 * 24)) / 8760);
    const dayTurn = -Math.cos((2 * Math.PI * ((hour % 24) + 0.5 - 3)) / 24);
    const height = Math.sin((Math.PI * ((hour % 24) + 0.5 - 8)) / 8); // up from 8:00 to 16:00
    const ghiWPerM2 = Math.max(0, height * (250 + 150 * yearTurn));
    const dryBulbC = 9 + warmerK + 10 * yearTurn + 4 * dayTurn;
    lines.push(`${hour},${dryBulbC.toFixed(2)},0.6,3,${ghiWPerM2.toFixed(1)}`);
  }
  return `${lines.join('\n')}\n`;
}
