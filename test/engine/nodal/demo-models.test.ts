// The two nodal models of the demo: laws that hold for any network (energy in = energy out + stored,
// no temperature beyond what drives it), and faults that a user can make in such a file.
import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { march, parseNodalModel, parseNodalProblem } from '../../../engine/index.ts';
import { faultText, readNumberTable } from '../../../weather/index.ts';

const method = { toleranceK: 1e-8, maxIterations: 50 };
type Json = ReturnType<typeof JSON.parse>;

function problemOf(name: string, change: (document: Json) => void = () => {}) {
  const document: Json = JSON.parse(readFileSync(`demo/${name}`, 'utf8'));
  change(document);
  const model = parseNodalModel(document, name);
  if (!model.ok) return model;
  const tableFile = model.value.table?.file;
  const table = tableFile
    ? readNumberTable(readFileSync(`demo/${tableFile}`, 'utf8'), tableFile)
    : null;
  if (table && !table.ok) return table;
  return parseNodalProblem(model.value, table ? table.value : null, name);
}

const faultsAfter = (name: string, change: (document: Json) => void) => {
  const parsed = problemOf(name, change);
  return parsed.ok ? [] : parsed.faults.map(faultText);
};

test.each(['loft-tank.network.json', 'solar-wall.network.json'])(
  '%s closes its heat balance',
  (name) => {
    const parsed = problemOf(name);
    if (!parsed.ok) throw new Error(parsed.faults.map(faultText).join('\n'));
    const run = march(parsed.value, method);
    expect(run.outcome.kind).toBe('finished');
    expect(run.quality.unconvergedSteps).toBe(0);
    expect(run.quality.relativeBalanceResidual).toBeLessThan(1e-9);
  },
);

test('no part of the loft gets colder than the sky or warmer than the house and its start', () => {
  const parsed = problemOf('loft-tank.network.json');
  if (!parsed.ok) throw new Error('does not parse');
  const run = march(parsed.value, method);
  const sky = readNumberTable(readFileSync('demo/frosty-nights.csv', 'utf8'), 'csv');
  if (!sky.ok) throw new Error('no table');
  const coldest = Math.min(...(sky.value.columns.get('skyC') ?? []));
  for (const temperature of run.meanC) {
    expect(temperature).toBeGreaterThan(coldest - 1e-6);
    expect(temperature).toBeLessThan(9 + 1e-6);
  }
});

test('a fluid loop whose flows do not balance is refused by name', () => {
  const messages = faultsAfter('solar-wall.network.json', (d) => {
    d.directedLinks.splice(2, 1);
  });
  expect(messages.join()).toContain('store');
});

test('unknown nodes, columns and missing starts are named with their place', () => {
  expect(
    faultsAfter('loft-tank.network.json', (d) => {
      d.links[3].to = 'attic';
    })[0],
  ).toContain('links[3].to: found "attic"');
  expect(
    faultsAfter('loft-tank.network.json', (d) => {
      d.nodes[0].boundaryC.column = 'outC';
    })[0],
  ).toContain("one of the table's columns: hour, outdoorC, skyC");
  expect(
    faultsAfter('loft-tank.network.json', (d) => {
      delete d.nodes[3].startC;
    })[0],
  ).toContain('nodes[3].startC');
});
