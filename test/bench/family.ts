// The benchmark family: N rooms in a grid, as linear (L) or state-following (V) networks, free or
// with ideal plant. Everything is fixed by the family's own page of definitions; material and surface
// values are representative ones, not a reference. Its check numbers: test/bench/family.test.ts.

import type {
  BuoyantLinks,
  LinkGroup,
  Meter,
  Network,
  Plant,
  Problem,
  ScaledLinks,
  Series,
} from '../../engine/network/index.ts';
import { type Drivers, driverNames, driverSeries } from './family-drivers.ts';
import { constructions, type Layers, materials } from './family-fabric.ts';

export type Kind = 'L' | 'V';

export interface Family {
  readonly problem: Problem;
  readonly rooms: number;
  readonly airNodes: Int32Array;
  readonly sums: {
    readonly nodes: number;
    readonly chains: number;
    readonly sharedChains: number;
    readonly capacityJPerK: number;
    readonly fabricWPerK: number;
    readonly insideConvectionWPerK: number;
    readonly infiltrationWPerK: number;
    readonly windowM2: number;
  };
  readonly firstDraws: readonly number[];
}

const grids: Readonly<Record<number, readonly [number, number, number]>> = {
  1: [1, 1, 1],
  4: [2, 2, 1],
  16: [4, 2, 2],
  64: [8, 2, 4],
  256: [16, 2, 8],
};

/** mulberry32: numbers in [0, 1) from a 32-bit state. */
function mulberry32(start: number): () => number {
  let a = start >>> 0;
  return () => {
    a = (a + 0x6d2b79f5) >>> 0;
    let t = Math.imul(a ^ (a >>> 15), a | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 2 ** 32;
  };
}

/** Growing lists that become a network. */
function createLists() {
  const names: string[] = [];
  const capacity: number[] = [];
  const boundary: number[] = [];
  return {
    names,
    capacity,
    boundary,
    constant: [] as [number, number, number][],
    scaled: [] as [number, number, number, number][],
    film: [] as [number, number, number][],
    air: [] as [number, number, number][],
    directed: [] as [number, number, number][],
    sources: [] as [number, number, number][],
    node(name: string, capacityJPerK: number, series = -1): number {
      names.push(name);
      capacity.push(capacityJPerK);
      boundary.push(series);
      return names.length - 1;
    },
  };
}

const slots = ['south', 'north', 'west', 'east', 'floor', 'ceiling', 'window'] as const;
type Slot = (typeof slots)[number];

/** Builds the N-room problem over one year of drivers at `stepS`. */
export function buildFamily(
  n: number,
  kind: Kind,
  withPlant: boolean,
  drivers: Drivers,
  stepS = 900,
  hours = 8760,
): Family {
  const [nx, ny, nz] = grids[n];
  const stepsPerHour = 3600 / stepS;
  const stepCount = hours * stepsPerHour;
  const lists = createLists();
  const series: Series[] = driverSeries(drivers, stepsPerHour, hours);
  const at = (name: (typeof driverNames)[number]) => driverNames.indexOf(name);
  const outside = lists.node('outdoor air', 0, at('outdoor'));
  const sky = lists.node('sky', 0, at('sky'));
  const ground = lists.node('ground', 0, at('ground'));

  const random = mulberry32(725650 + n);
  const draws = Array.from({ length: n }, () => Array.from({ length: 5 }, random));
  const windowM2 = draws.map((u) => 3 + 2 * u[1]);
  const airNode = draws.map((u, i) => lists.node(`room ${i} air`, 1200 * 75 * (1.2 + 0.8 * u[0])));
  const surfaces = draws.map(() => new Map<Slot, { node: number; areaM2: number }>());
  let fabric = 0;
  let chains = 0;
  let shared = 0;

  /** Adds a construction; gives its node at A and at B. */
  const chain = (name: string, layers: Layers, areaM2: number): [number, number] => {
    chains++;
    const first = lists.node(`${name} 0`, 0);
    let last = first;
    for (const [thicknessM, slices, material] of layers) {
      const { conductivity, density, heat } = materials[material];
      const dx = thicknessM / slices;
      for (let s = 0; s < slices; s++) {
        const half = (density * heat * areaM2 * dx) / 2;
        lists.capacity[last] += half;
        const next = lists.node(`${name} ${lists.names.length}`, half);
        const g = (conductivity * areaM2) / dx;
        lists.constant.push([last, next, g]);
        fabric += g;
        last = next;
      }
    }
    return [first, last];
  };
  const outer = (node: number, areaM2: number, sun: number, share: number, view: number) => {
    if (kind === 'L') lists.constant.push([outside, node, 20 * areaM2]);
    else lists.scaled.push([outside, node, areaM2, at('film')]);
    lists.constant.push([sky, node, 4.5 * view * areaM2]);
    if (view < 1) lists.constant.push([outside, node, 4.5 * (1 - view) * areaM2]);
    lists.sources.push([node, share * areaM2, sun]);
  };

  for (let i = 0; i < n; i++) {
    const x = i % nx;
    const y = Math.floor(i / nx) % ny;
    const z = Math.floor(i / (nx * ny));
    const windowSlot: Slot = y === 0 ? 'south' : 'north';
    const set = (slot: Slot, node: number, areaM2: number, room = i) =>
      surfaces[room].set(slot, { node, areaM2 });
    const wall = (slot: Slot, layers: Layers) => {
      const areaM2 = 15 - (slot === windowSlot ? windowM2[i] : 0);
      const [a, b] = chain(`room ${i} ${slot}`, layers, areaM2);
      outer(a, areaM2, at(slot as 'south' | 'north' | 'west' | 'east'), 0.6, 0.5);
      set(slot, b, areaM2);
    };
    const partition = (slot: Slot, other: Slot, j: number, layers: Layers, areaM2: number) => {
      const [a, b] = chain(`room ${i} ${slot}`, layers, areaM2);
      shared++;
      set(slot, a, areaM2);
      set(other, b, areaM2, j);
    };
    if (y === 0) wall('south', constructions.heavyWall);
    if (y === ny - 1) wall('north', constructions.heavyWall);
    else partition('north', 'south', i + nx, constructions.brickPartition, 15);
    if (x === 0) wall('west', constructions.timberWall);
    if (x === nx - 1) wall('east', constructions.timberWall);
    else {
      const layers = x % 2 === 0 ? constructions.brickPartition : constructions.lightPartition;
      partition('east', 'west', i + 1, layers, 15);
    }
    if (z === 0) {
      const [a, b] = chain(`room ${i} floor`, constructions.groundFloor, 25);
      lists.constant.push([ground, a, 5 * 25]);
      set('floor', b, 25);
    }
    if (z === nz - 1) {
      const [a, b] = chain(`room ${i} roof`, constructions.roof, 25);
      outer(a, 25, at('roof'), 0.6, 1);
      set('ceiling', b, 25);
    } else partition('ceiling', 'floor', i + nx * ny, constructions.slab, 25);
    const pane = 7500 * windowM2[i];
    const a = lists.node(`room ${i} outer pane`, pane);
    const b = lists.node(`room ${i} inner pane`, pane);
    lists.constant.push([a, b, 1.6 * windowM2[i]]);
    fabric += 1.6 * windowM2[i];
    chains++;
    outer(a, windowM2[i], at(windowSlot), 0.08, 0.5);
    set('window', b, windowM2[i]);
  }

  let inside = 0;
  let infiltration = 0;
  for (let i = 0; i < n; i++) {
    const y = Math.floor(i / nx) % ny;
    const u = draws[i];
    const air = airNode[i];
    const room = slots.map((slot) => {
      const surface = surfaces[i].get(slot);
      if (!surface) throw new Error(`room ${i} has no ${slot}`);
      return { slot, ...surface };
    });
    const furniture = lists.node(`room ${i} furniture`, 25 * (15 + 15 * u[4]) * 1000);
    lists.constant.push([furniture, air, 75]);
    for (const { slot, node, areaM2 } of room) {
      const [h, a] =
        slot === 'floor' ? [2.0, 1.51] : slot === 'ceiling' ? [1.5, 0.76] : [2.5, 1.31];
      inside += h * areaM2;
      if (kind === 'L') lists.constant.push([node, air, h * areaM2]);
      else lists.film.push([node, air, a * areaM2]);
    }
    const g = room.map((s) => 5.1 * s.areaM2);
    const total = g.reduce((a, b) => a + b, 0);
    for (let p = 0; p < room.length; p++) {
      for (let q = p + 1; q < room.length; q++) {
        lists.constant.push([room[p].node, room[q].node, (g[p] * g[q]) / total]);
      }
    }
    const n0 = 0.3 + 0.3 * u[2];
    const leak = ((1200 * 75) / 3600) * n0;
    infiltration += leak;
    if (kind === 'L') lists.constant.push([outside, air, leak]);
    else lists.air.push([outside, air, leak]);

    const opaque = room.filter((s) => s.slot !== 'window');
    const opaqueM2 = opaque.reduce((a, s) => a + s.areaM2, 0);
    const others = opaque.filter((s) => s.slot !== 'floor');
    const othersM2 = others.reduce((a, s) => a + s.areaM2, 0);
    const sun = y === 0 ? at('south') : at('north');
    const transmitted = 0.5 * windowM2[i];
    for (const s of opaque) {
      const share = s.slot === 'floor' ? 0.5 : (0.3 * s.areaM2) / othersM2;
      lists.sources.push([s.node, transmitted * share, sun]);
    }
    lists.sources.push([furniture, transmitted * 0.2, sun]);
    const gain = series.length;
    const day = 25 * (5 + 5 * u[3]);
    series.push({
      name: `room ${i} gain`,
      hold: 'step',
      values: Float64Array.from({ length: stepCount }, (_, k) => {
        const hour = Math.floor(k / stepsPerHour) % 24;
        return hour >= 8 && hour <= 17 ? day : 25;
      }),
    });
    lists.sources.push([air, 0.6, gain]);
    for (const s of opaque) lists.sources.push([s.node, (0.4 * s.areaM2) / opaqueM2, gain]);
  }
  for (let z = 0; z < nz && n > 1; z++) {
    const at0 = z * nx * ny;
    const loop = [
      ...Array.from({ length: nx }, (_, x) => at0 + x),
      ...Array.from({ length: nx }, (_, x) => at0 + nx + (nx - 1 - x)),
    ];
    loop.forEach((room, k) => {
      const before = loop[(k + loop.length - 1) % loop.length];
      lists.directed.push([airNode[before], airNode[room], 0.02 * 1006]);
    });
  }

  const links: LinkGroup[] = [
    {
      law: 'constant',
      from: Int32Array.from(lists.constant, (l) => l[0]),
      to: Int32Array.from(lists.constant, (l) => l[1]),
      conductanceWPerK: Float64Array.from(lists.constant, (l) => l[2]),
    },
  ];
  if (kind === 'V') {
    const scaled: ScaledLinks = {
      law: 'scaled',
      from: Int32Array.from(lists.scaled, (l) => l[0]),
      to: Int32Array.from(lists.scaled, (l) => l[1]),
      conductanceWPerK: Float64Array.from(lists.scaled, (l) => l[2]),
      series: Int32Array.from(lists.scaled, (l) => l[3]),
    };
    const buoyant = (rows: [number, number, number][], exponent: number): BuoyantLinks => ({
      law: 'buoyant',
      from: Int32Array.from(rows, (l) => l[0]),
      to: Int32Array.from(rows, (l) => l[1]),
      warmerFrom: Float64Array.from(rows, (l) => l[2]),
      coolerFrom: Float64Array.from(rows, (l) => l[2]),
      exponent,
      softeningK2: 0.01,
      baseSeries: new Int32Array(rows.length).fill(-1),
      baseWPerK: new Float64Array(rows.length),
    });
    const infiltrate = buoyant(
      lists.air.map(([a, b, g]) => [a, b, 0.02 * g]),
      1,
    );
    infiltrate.baseSeries.fill(at('leak'));
    infiltrate.baseWPerK.set(lists.air.map((l) => l[2]));
    links.push(scaled, buoyant(lists.film, 1 / 3), infiltrate);
  }
  const plants: Plant[] = withPlant
    ? airNode.flatMap((air, i) => {
        const on = {
          sensorNodes: Int32Array.of(air),
          sensorWeights: Float64Array.of(1),
          deliveryNodes: Int32Array.of(air),
          deliveryShares: Float64Array.of(1),
          bandK: 0,
        };
        const heater: Plant = {
          ...on,
          name: `room ${i} heater`,
          kind: 'heater',
          setPointSeries: at('heat'),
          maxSeries: at('heaterMax'),
        };
        const chiller: Plant = {
          ...on,
          name: `room ${i} chiller`,
          kind: 'chiller',
          setPointSeries: at('cool'),
          maxSeries: at('chillerMax'),
        };
        return [heater, chiller];
      })
    : [];
  const network: Network = {
    nodeNames: lists.names,
    capacityJPerK: Float64Array.from(lists.capacity),
    boundarySeries: Int32Array.from(lists.boundary),
    links,
    enclosures: [],
    directed: {
      from: Int32Array.from(lists.directed, (l) => l[0]),
      to: Int32Array.from(lists.directed, (l) => l[1]),
      rateWPerK: Float64Array.from(lists.directed, (l) => l[2]),
      series: new Int32Array(lists.directed.length).fill(-1),
    },
    sources: {
      node: Int32Array.from(lists.sources, (s) => s[0]),
      factor: Float64Array.from(lists.sources, (s) => s[1]),
      series: Int32Array.from(lists.sources, (s) => s[2]),
    },
    plants,
  };
  const total = (name: string, keep: (p: Plant) => boolean): Meter => ({
    name,
    terms: plants.flatMap((p, index) =>
      keep(p) ? [{ sign: 1, of: { kind: 'plant' as const, index } }] : [],
    ),
  });
  const problem: Problem = {
    network,
    stepS,
    stepCount,
    series,
    start: { kind: 'temperatures', tempC: new Float64Array(lists.names.length).fill(15) },
    stepsPerRecord: stepsPerHour,
    recordNodes: Int32Array.from(airNode),
    meters: [
      total('heating', (p) => p.kind === 'heater'),
      total('cooling', (p) => p.kind === 'chiller'),
    ],
  };
  return {
    problem,
    rooms: n,
    airNodes: Int32Array.from(airNode),
    sums: {
      nodes: lists.names.length - 3,
      chains,
      sharedChains: shared,
      capacityJPerK: lists.capacity.reduce((a, b) => a + b, 0),
      fabricWPerK: fabric,
      insideConvectionWPerK: inside,
      infiltrationWPerK: infiltration,
      windowM2: windowM2.reduce((a, b) => a + b, 0),
    },
    firstDraws: draws[0],
  };
}
