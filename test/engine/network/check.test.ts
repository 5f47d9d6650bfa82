// What an unsound problem is told: every breach at once, with the names of its nodes.

import { expect, test } from 'vitest';
import { assertSound, checkNetwork, type Plant } from '../../../engine/network/index.ts';
import {
  constant,
  constantLinks,
  directedLinks,
  held,
  network,
  problem,
  sourceRows,
} from './problems.ts';

const out = constant('out', 0, 2);
const texts = (p: Parameters<typeof checkNetwork>[0]) => checkNetwork(p).map((b) => b.text);
const base = (parts: Parameters<typeof network>[2], caps = [1e5, 1e6, 0], series = [out]) =>
  problem(network(caps, { 2: 0 }, parts), series, 900, 2, [20, 20, 0]);
const sound = constantLinks([
  [0, 1, 10],
  [1, 2, 5],
]);

test('a sound network has no breach', () => {
  expect(checkNetwork(base({ links: [sound] }))).toEqual([]);
});

test('an unknown node is told by place', () => {
  expect(texts(base({ links: [constantLinks([[0, 7, 1]])] }))).toEqual([
    'links 0 (constant) to: entry 0 is 7, expected 0 to 2',
  ]);
});

test('negative and missing values name the nodes', () => {
  const p = base(
    {
      links: [
        constantLinks([
          [0, 1, -1],
          [1, 2, Number.NaN],
        ]),
      ],
    },
    [-5, 1e6, 0],
  );
  expect(texts(p)).toEqual([
    'n0: capacity -5 J/K, expected 0 or more',
    'links 0 (constant), n0 to n1: conductance -1, expected 0 or more',
    'links 0 (constant), n1 to n2: conductance NaN, expected 0 or more',
  ]);
  expect(checkNetwork(p)[2].nodes).toEqual(['n1', 'n2']);
});

test('a series of the wrong length is told', () => {
  expect(texts(base({ links: [sound] }, undefined, [constant('out', 0, 3)]))).toEqual([
    'series out: 3 values, expected 2',
  ]);
});

test('a gap in a driver is told with its step', () => {
  expect(texts(base({ links: [sound] }, undefined, [held('out', [0, Number.NaN])]))).toEqual([
    'series out: NaN at step 1, expected a number',
  ]);
});

test('massless nodes that reach nothing are told', () => {
  expect(texts(base({ links: [constantLinks([[1, 2, 5]])] }, [0, 1e6, 0]))).toEqual([
    'n0 has no capacity and no link',
  ]);
  const pair = problem(
    network(
      [0, 0, 1e5, 0],
      { 3: 0 },
      {
        links: [
          constantLinks([
            [0, 1, 1],
            [2, 3, 1],
          ]),
        ],
      },
    ),
    [out],
    900,
    2,
    [0, 0, 0, 0],
  );
  expect(texts(pair)).toEqual(['n0, n1 have no capacity and reach no boundary']);
});

test('air that flows in and not out is told, and a flow that balances is not', () => {
  const lost = base({ links: [sound], directed: directedLinks([[2, 0, 10]]) });
  expect(texts(lost)).toEqual(['n0: 10 W/K of air flows in, 0 W/K out at step 0']);
  expect(
    texts(
      base({
        links: [sound],
        directed: directedLinks([
          [2, 0, 10],
          [0, 2, 10],
        ]),
      }),
    ),
  ).toEqual([]);
});

test('flows on two series are balanced step by step', () => {
  const series = [out, held('in', [1, 2]), held('off', [1, 1])];
  const flows = directedLinks([
    [2, 0, 10, 1],
    [0, 2, 10, 2],
  ]);
  expect(texts(base({ links: [sound], directed: flows }, undefined, series))).toEqual([
    'n0: 20 W/K of air flows in, 10 W/K out at step 1',
  ]);
  const even = [out, held('in', [1, 2]), held('off', [1, 2])];
  expect(texts(base({ links: [sound], directed: flows }, undefined, even))).toEqual([]);
});

test('an enclosure that is not its own mirror image names the pair', () => {
  const enclosures = [
    { name: 'room', nodes: Int32Array.of(0, 1), exchangeAreaM2: Float64Array.of(0, 2, 3, 0) },
  ];
  expect(texts(base({ links: [sound], enclosures }))).toEqual([
    'enclosure room, n1 to n0: 3 m² one way, 2 m² the other',
  ]);
});

test('plants with shares that do not add up, or that fight each other, are told', () => {
  const plant = (kind: Plant['kind'], set: number, share: number): Plant => ({
    name: kind,
    kind,
    sensorNodes: Int32Array.of(0),
    sensorWeights: Float64Array.of(1),
    deliveryNodes: Int32Array.of(0),
    deliveryShares: Float64Array.of(share),
    setPointSeries: set,
    maxSeries: 3,
    bandK: 0,
  });
  const series = [out, constant('20', 20, 2), constant('25', 25, 2), constant('max', 500, 2)];
  expect(
    texts(base({ links: [sound], plants: [plant('heater', 1, 0.7)] }, undefined, series)),
  ).toEqual(['plant heater: delivery shares add up to 0.7, expected 1']);
  const fight = base(
    { links: [sound], plants: [plant('heater', 2, 1), plant('chiller', 1, 1)] },
    undefined,
    series,
  );
  expect(texts(fight)).toEqual([
    'plant heater: heats to 25 °C while chiller keeps 20 °C at step 0',
  ]);
});

test('the march refuses an unsound problem and lists every breach', () => {
  const p = base({
    links: [
      constantLinks([
        [0, 1, -1],
        [1, 2, -2],
      ]),
    ],
    sources: sourceRows([]),
  });
  expect(() => assertSound(p)).toThrow(/n0 to n1: conductance -1.*\n.*n1 to n2: conductance -2/);
});
