// Elimination order of the reduced system, by least degree. Nodes that never change are taken first
// where they cost no fill, so that the part which is factored again in every iteration stays small.

export interface Graph {
  readonly neighbours: readonly Set<number>[];
  /** 0 constant rows, 1 rows that change with the drivers, 2 rows that change with the state. */
  readonly level: Uint8Array;
  /** Unknowns that may only follow when `ready` says so (their own pivot is empty at first). */
  readonly late: ReadonlyMap<number, Late>;
}

/** A plant's unknown: its pivot fills once a sensor node and a delivery node hang together. */
export interface Late {
  readonly sensors: readonly number[];
  readonly deliveries: readonly number[];
}

export interface Order {
  /** Unknown at each place of the order. */
  readonly sequence: Int32Array;
  /** Rows that hang together stand together: group b from `blockStart[b]` to `blockStart[b + 1] − 1`. */
  readonly blockStart: Int32Array;
  /** For each place, the places after it that it is coupled to when its turn comes, ascending. */
  readonly upper: readonly Int32Array[];
}

/**
 * Least-degree order with the elimination's fill; ties go to the lowest number.
 *
 * Source: the greedy rule of W. F. Tinney & J. W. Walker, "Direct solutions of sparse network
 * equations by optimally ordered triangular factorization", Proc. IEEE 55 (1967) 1801-1809.
 */
export function eliminationOrder(graph: Graph): Order {
  const n = graph.neighbours.length;
  const adjacent = graph.neighbours.map((s) => new Set(s));
  const gone = new Uint8Array(n);
  const parent = Int32Array.from({ length: n }, (_, i) => i);
  const find = (i: number): number => {
    let r = i;
    while (parent[r] !== r) r = parent[r];
    return r;
  };
  const sequence = new Int32Array(n);
  const coupled: number[][] = [];
  let placed = 0;

  const isReady = (i: number): boolean => {
    const late = graph.late.get(i);
    if (!late) return true;
    for (const j of late.sensors) if (gone[j] === 0) return false;
    for (const j of late.deliveries) if (gone[j] === 0) return false;
    return late.sensors.some((s) => late.deliveries.some((d) => find(s) === find(d)));
  };
  const eliminate = (i: number) => {
    const around = [...adjacent[i]];
    sequence[placed++] = i;
    coupled.push(around);
    gone[i] = 1;
    for (const j of graph.neighbours[i]) {
      if (gone[j] === 1 && !graph.late.has(j) && !graph.late.has(i)) parent[find(j)] = find(i);
    }
    for (const j of around) {
      adjacent[j].delete(i);
      for (const k of around) if (k !== j) adjacent[j].add(k);
    }
    adjacent[i].clear();
  };
  const pass = (highestLevel: number, degreeLimit: number) => {
    for (;;) {
      let best = -1;
      let bestDegree = degreeLimit + 1;
      for (let i = 0; i < n; i++) {
        if (gone[i] === 1 || adjacent[i].size >= bestDegree) continue;
        if (graph.level[i] > highestLevel || !isReady(i)) continue;
        best = i;
        bestDegree = adjacent[i].size;
      }
      if (best < 0) return;
      eliminate(best);
    }
  };
  pass(0, 2);
  pass(1, 2);
  pass(2, n);
  // A plant whose sensor and delivery never hang together comes last; its pivot shows as zero later.
  for (let i = 0; i < n; i++) if (gone[i] === 0) eliminate(i);

  const { order, blockStart } = together(graph, sequence);
  const place = new Int32Array(n);
  const moved = Int32Array.from(order, (p) => sequence[p]);
  for (let p = 0; p < n; p++) place[moved[p]] = p;
  const upper = Array.from(order, (p) => Int32Array.from(coupled[p], (j) => place[j]).sort());
  return { sequence: moved, blockStart, upper };
}

/** Places sorted by the part of the graph that they belong to, parts in the order of their first place. */
function together(
  graph: Graph,
  sequence: Int32Array,
): { order: Int32Array; blockStart: Int32Array } {
  const n = sequence.length;
  const part = new Int32Array(n).fill(-1);
  let parts = 0;
  for (const first of sequence) {
    if (part[first] >= 0) continue;
    part[first] = parts;
    const waiting = [first];
    for (let i = waiting.pop(); i !== undefined; i = waiting.pop()) {
      for (const j of graph.neighbours[i]) {
        if (part[j] >= 0) continue;
        part[j] = parts;
        waiting.push(j);
      }
    }
    parts++;
  }
  const blockStart = new Int32Array(parts + 1);
  for (const p of part) blockStart[p + 1]++;
  for (let b = 0; b < parts; b++) blockStart[b + 1] += blockStart[b];
  const next = blockStart.slice(0, parts);
  const order = new Int32Array(n);
  sequence.forEach((v, p) => {
    order[next[part[v]]++] = p;
  });
  return { order, blockStart };
}
