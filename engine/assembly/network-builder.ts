// Collects nodes, links and sources one by one, each with its provenance, and packs them into the
// arrays of a Network. The only place that knows both the names and the numbers of things.
import type {
  ConductanceTable,
  Enclosure,
  LinkGroup,
  Meter,
  MeterTerm,
  Network,
  Plant,
  Series,
} from '../network/index.ts';

/** Where a node or link comes from: what a person asks when they point at it. */
export interface Provenance {
  readonly name: string;
  readonly room?: string;
  readonly surface?: string;
  /** What it stands for, as a sentence part: "conduction, brick 0.20 m". */
  readonly what: string;
  /** The formula or published method behind its value. */
  readonly method: string;
  /** Its inputs in SI, unit in the name. */
  readonly inputs: Readonly<Record<string, number | string>>;
}

export type FlowRef = MeterTerm['of'];
type LinkRef = Extract<FlowRef, { kind: 'link' }>;

interface Rows {
  readonly from: number[];
  readonly to: number[];
  readonly about: Provenance[];
}

const rows = (): Rows => ({ from: [], to: [], about: [] });

/** Keeps a film from vanishing where face and air are equally warm: a tenth at 0 K, 0.002 % at 0.1 K. */
const softeningK2 = 1e-6;

/** Order of the link groups in the network that is built. */
const group = { constant: 0, scaled: 1, buoyant: 2, mixed: 3, radiant: 4, function: 5 } as const;

/** A network in the making. Not immutable: it lives inside `assemble` only. */
export class NetworkBuilder {
  private readonly nodeAbout: Provenance[] = [];
  private readonly capacities: number[] = [];
  private readonly boundary: number[] = [];
  private readonly seriesList: Series[] = [];
  private readonly constants = new Map<number, number>();
  private readonly constant = { ...rows(), value: [] as number[] };
  private readonly scaled = { ...rows(), value: [] as number[], series: [] as number[] };
  private readonly buoyant = { ...rows(), warmer: [] as number[], cooler: [] as number[] };
  private readonly mixed = {
    ...rows(),
    area: [] as number[],
    warmer: [] as number[],
    cooler: [] as number[],
    series: [] as number[],
    roughness: [] as number[],
  };
  private readonly radiant = { ...rows(), value: [] as number[] };
  private readonly laws = {
    ...rows(),
    law: [] as ((fromC: number, toC: number, step: number) => number)[],
    table: [] as (ConductanceTable | null)[],
  };
  private readonly enclosures: Enclosure[] = [];
  private readonly directed = { ...rows(), rate: [] as number[], series: [] as number[] };
  private readonly sources = {
    node: [] as number[],
    factor: [] as number[],
    series: [] as number[],
    about: [] as string[],
  };
  private readonly plants: Plant[] = [];
  private readonly meterNames: string[] = [];
  private readonly meterTerms: MeterTerm[][] = [];

  private readonly stepCount: number;

  constructor(stepCount: number) {
    this.stepCount = stepCount;
  }

  node(about: Provenance, capacityJPerK: number, boundarySeries = -1): number {
    this.nodeAbout.push(about);
    this.capacities.push(capacityJPerK);
    this.boundary.push(boundarySeries);
    return this.nodeAbout.length - 1;
  }

  /** Adds to a node's capacity, for a thing that shares its temperature. */
  addCapacity(node: number, capacityJPerK: number): void {
    this.capacities[node] += capacityJPerK;
  }

  series(name: string, hold: Series['hold'], values: Float64Array): number {
    this.seriesList.push({ name, hold, values });
    return this.seriesList.length - 1;
  }

  /** A series with one value all year; asked for twice it is made once. */
  constantSeries(value: number): number {
    const known = this.constants.get(value);
    if (known !== undefined) return known;
    const index = this.series(
      `constant ${value}`,
      'step',
      new Float64Array(this.stepCount).fill(value),
    );
    this.constants.set(value, index);
    return index;
  }

  constantLink(from: number, to: number, conductanceWPerK: number, about: Provenance): LinkRef {
    this.constant.value.push(conductanceWPerK);
    return pushed(this.constant, from, to, about, group.constant);
  }

  scaledLink(
    from: number,
    to: number,
    conductanceWPerK: number,
    series: number,
    about: Provenance,
  ): LinkRef {
    this.scaled.value.push(conductanceWPerK);
    this.scaled.series.push(series);
    return pushed(this.scaled, from, to, about, group.scaled);
  }

  /** One-third power law; coefficients in W/K per K^(1/3). */
  buoyantLink(
    from: number,
    to: number,
    warmerFrom: number,
    coolerFrom: number,
    about: Provenance,
  ): LinkRef {
    this.buoyant.warmer.push(warmerFrom);
    this.buoyant.cooler.push(coolerFrom);
    return pushed(this.buoyant, from, to, about, group.buoyant);
  }

  mixedFilmLink(
    from: number,
    to: number,
    film: {
      areaM2: number;
      warmerFrom: number;
      coolerFrom: number;
      roughness: number;
      series: number;
    },
    about: Provenance,
  ): LinkRef {
    this.mixed.area.push(film.areaM2);
    this.mixed.warmer.push(film.warmerFrom);
    this.mixed.cooler.push(film.coolerFrom);
    this.mixed.series.push(film.series);
    this.mixed.roughness.push(film.roughness);
    return pushed(this.mixed, from, to, about, group.mixed);
  }

  radiantLink(from: number, to: number, exchangeAreaM2: number, about: Provenance): LinkRef {
    this.radiant.value.push(exchangeAreaM2);
    return pushed(this.radiant, from, to, about, group.radiant);
  }

  /** Any law of the two temperatures and the step; where it is a table, that serves in its place. */
  functionLink(
    from: number,
    to: number,
    law: (fromC: number, toC: number, step: number) => number,
    about: Provenance,
    table: ConductanceTable | null = null,
  ): LinkRef {
    this.laws.law.push(law);
    this.laws.table.push(table);
    return pushed(this.laws, from, to, about, group.function);
  }

  enclosure(enclosure: Enclosure): number {
    this.enclosures.push(enclosure);
    return this.enclosures.length - 1;
  }

  directedLink(
    from: number,
    to: number,
    rateWPerK: number,
    series: number,
    about: Provenance,
  ): FlowRef {
    this.directed.from.push(from);
    this.directed.to.push(to);
    this.directed.about.push(about);
    this.directed.rate.push(rateWPerK);
    this.directed.series.push(series);
    return { kind: 'directed', index: this.directed.from.length - 1 };
  }

  source(node: number, factor: number, series: number, about: string): FlowRef {
    this.sources.node.push(node);
    this.sources.factor.push(factor);
    this.sources.series.push(series);
    this.sources.about.push(about);
    return { kind: 'source', index: this.sources.node.length - 1 };
  }

  plant(plant: Plant): number {
    this.plants.push(plant);
    return this.plants.length - 1;
  }

  meter(name: string): number {
    this.meterNames.push(name);
    this.meterTerms.push([]);
    return this.meterNames.length - 1;
  }

  count(meter: number, sign: number, of: FlowRef): void {
    this.meterTerms[meter].push({ sign, of });
  }

  get nodeCount(): number {
    return this.nodeAbout.length;
  }

  network(): Network {
    const i32 = (list: readonly number[]) => Int32Array.from(list);
    const f64 = (list: readonly number[]) => Float64Array.from(list);
    const ends = (r: Rows) => ({ from: i32(r.from), to: i32(r.to) });
    const { laws } = this;
    const lawList = [...laws.law];
    const links: LinkGroup[] = [
      { law: 'constant', ...ends(this.constant), conductanceWPerK: f64(this.constant.value) },
      {
        law: 'scaled',
        ...ends(this.scaled),
        conductanceWPerK: f64(this.scaled.value),
        series: i32(this.scaled.series),
      },
      {
        law: 'buoyant',
        ...ends(this.buoyant),
        warmerFrom: f64(this.buoyant.warmer),
        coolerFrom: f64(this.buoyant.cooler),
        exponent: 1 / 3,
        softeningK2,
        baseSeries: new Int32Array(this.buoyant.from.length).fill(-1),
        baseWPerK: new Float64Array(this.buoyant.from.length),
      },
      {
        law: 'mixed-film',
        ...ends(this.mixed),
        areaM2: f64(this.mixed.area),
        warmerFrom: f64(this.mixed.warmer),
        coolerFrom: f64(this.mixed.cooler),
        exponent: 1 / 3,
        forcedSeries: i32(this.mixed.series),
        roughness: f64(this.mixed.roughness),
      },
      { law: 'radiant', ...ends(this.radiant), exchangeAreaM2: f64(this.radiant.value) },
      {
        law: 'function',
        ...ends(laws),
        conductanceWPerK: (k, fromC, toC, step) => lawList[k](fromC, toC, step),
        tables: [...laws.table],
      },
    ];
    return {
      nodeNames: this.nodeAbout.map((about) => about.name),
      capacityJPerK: f64(this.capacities),
      boundarySeries: i32(this.boundary),
      links,
      enclosures: [...this.enclosures],
      directed: {
        ...ends(this.directed),
        rateWPerK: f64(this.directed.rate),
        series: i32(this.directed.series),
      },
      sources: {
        node: i32(this.sources.node),
        factor: f64(this.sources.factor),
        series: i32(this.sources.series),
      },
      plants: [...this.plants],
    };
  }

  allSeries(): readonly Series[] {
    return [...this.seriesList];
  }

  meters(): readonly Meter[] {
    return this.meterNames.map((name, m) => ({ name, terms: [...this.meterTerms[m]] }));
  }

  /** Provenance of every node, of the links group by group, of the directed links and sources. */
  provenance() {
    return {
      nodes: [...this.nodeAbout],
      links: [this.constant, this.scaled, this.buoyant, this.mixed, this.radiant, this.laws].map(
        (r) => [...r.about],
      ),
      directed: [...this.directed.about],
      sources: [...this.sources.about],
    };
  }
}

function pushed(r: Rows, from: number, to: number, about: Provenance, index: number): LinkRef {
  r.from.push(from);
  r.to.push(to);
  r.about.push(about);
  return { kind: 'link', group: index, index: r.from.length - 1 };
}
