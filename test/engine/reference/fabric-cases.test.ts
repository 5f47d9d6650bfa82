// Whole rooms over a whole year: the fabric cases of ASHRAE Standard 140 (600 and 900 series, 2020
// edition) as described, from memory, in test/reference/fabric-cases.md. The ranges and the figures
// of an implementation independent of this project stand in the tables of that page and are read from
// it. Judged as the page says: ranges marked A or B widened by 2 % (0.3 K for temperatures); with the
// choices of its section 6, within 1.5 % of the independent figures (never tighter than 0.02 MWh,
// 0.05 kW, 0.3 K). Ranges marked C and the cooling of case 960 are hints.
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { afterAll, describe, expect, test } from 'vitest';
import { type Findings, parseProject, simulate } from '../../../engine/index.ts';
import { faultText, readWeather } from '../../../weather/index.ts';
import { record } from '../../reference/record.ts';

const weatherFile = '../shared/weather/tmy3-725650.csv';

interface Reference {
  readonly case: string;
  readonly quantity: string;
  readonly low: number;
  readonly high: number;
  readonly sure: string;
  readonly independent: number;
}

const page = readFileSync('test/reference/fabric-cases.md', 'utf8');
const references: Reference[] = page
  .slice(page.indexOf('## 8. Results'))
  .split('\n')
  .map((line) => line.split('|').map((cell) => cell.trim()))
  .filter((cells) => /^(\d{3}(FF)?)$/.test(cells[1] ?? ''))
  .map(([, name, quantity, range, sure, independent]) => {
    const [low, high] = range.includes(' to ')
      ? range.split(' to ').map(Number)
      : [Number.NaN, Number.NaN];
    // Minima and means of the free-floating cases stand in the rows after "highest air temperature".
    return { case: name, quantity, low, high, sure, independent: Number(independent) };
  });

const caseNames = [...new Set(references.map((one) => one.case))];

function figures(findings: Findings): Record<string, number> {
  const { building, rooms } = findings;
  const [{ airTemperatureC }] = rooms;
  return {
    'annual heating, MWh': building.heatingKWh / 1000,
    'annual cooling, MWh': building.coolingKWh / 1000,
    'peak heating, kW': building.peakHeatingW / 1000,
    'peak cooling, kW': building.peakCoolingW / 1000,
    'highest air temperature, C': airTemperatureC.max,
    'lowest, C': airTemperatureC.min,
    'mean, C': airTemperatureC.mean,
  };
}

const results: {
  readonly choice: string;
  readonly reference: Reference;
  readonly found: number;
}[] = [];

const weather = existsSync(weatherFile)
  ? readWeather(readFileSync(weatherFile), { file: weatherFile })
  : null;

function run(name: string, physics: Record<string, string>): Findings {
  if (!weather?.ok)
    throw new Error(weather ? weather.faults.map(faultText).join('\n') : 'no weather');
  const file = `test/reference/fabric/case-${name.toLowerCase()}.inglenook.json`;
  const document = { ...JSON.parse(readFileSync(file, 'utf8')), physics };
  const parsed = parseProject(JSON.stringify(document), file);
  if (!parsed.ok) throw new Error(parsed.faults.map(faultText).join('\n'));
  const steps = simulate(parsed.value, weather.value);
  let next = steps.next();
  while (!next.done) next = steps.next();
  return next.value.findings;
}

test('the page holds thirty figures for eight cases', () => {
  expect(caseNames).toHaveLength(8);
  expect(references).toHaveLength(30);
});

const isHint = ({ sure, case: name, quantity }: Reference) =>
  sure === 'C' ||
  Number.isNaN(Number(sure === '-' ? Number.NaN : 0)) ||
  (name === '960' && quantity.includes('cooling'));

/**
 * Figures that differ from the independent ones by more than the page allows, with what we believe;
 * reported, and held as failures so that a change shows.
 */
const reported: Readonly<Record<string, string>> = {
  '640 peak heating, kW':
    'the set-point climbs by 10 K within the peak hour: with steps of 15, 6 and 2 min, sampled early or late, ours closes in on 4.40 kW from both sides; a ramp sampled once in a step of 6 min moves the figure by 0.1 to 0.2 kW',
};

/** Allowed beyond the range: 2 % of the figure, or 0.3 K. */
const widened = (limit: number, quantity: string) =>
  quantity.endsWith(', C') ? 0.3 : 0.02 * Math.abs(limit);

/** Distance allowed from the independent figure. */
function allowance({ quantity, independent }: Reference): number {
  if (quantity.endsWith(', C')) return 0.3;
  return Math.max(0.015 * independent, quantity.endsWith('MWh') ? 0.02 : 0.05);
}

describe.skipIf(weather === null)(`fabric cases on ${weatherFile}`, () => {
  for (const name of caseNames) {
    const ofCase = references.filter((one) => one.case === name);

    test(`case ${name}, default physics, lies inside the remembered ranges`, () => {
      const found = figures(run(name, {}));
      for (const reference of ofCase) {
        const value = found[reference.quantity];
        results.push({ choice: 'default', reference, found: value });
        if (isHint(reference)) continue;
        const { low, high, quantity } = reference;
        expect
          .soft(value, `${name} ${quantity}`)
          .toBeGreaterThanOrEqual(low - widened(low, quantity));
        expect
          .soft(value, `${name} ${quantity}`)
          .toBeLessThanOrEqual(high + widened(high, quantity));
      }
    });

    test(`case ${name}, with the choices of section 6, agrees with the independent figures`, () => {
      const found = figures(run(name, { beamInside: 'patch' }));
      for (const reference of ofCase) {
        const value = found[reference.quantity];
        results.push({ choice: 'section 6', reference, found: value });
        record({
          file: 'fabric-cases.md',
          id: `${name} ${reference.quantity}`,
          worstShare: Math.abs(value - reference.independent) / allowance(reference),
          key: reference.quantity,
          compared: ['figure'],
          leftOut: {},
        });
        if (`${name} ${reference.quantity}` in reported) continue;
        expect
          .soft(Math.abs(value - reference.independent), `${name} ${reference.quantity}: ${value}`)
          .toBeLessThanOrEqual(allowance(reference));
      }
    });
  }

  for (const [key, reason] of Object.entries(reported))
    test.fails(`reported: ${key} agrees with the independent figure (${reason})`, () => {
      const one = results.find(
        ({ choice, reference }) =>
          choice === 'section 6' && `${reference.case} ${reference.quantity}` === key,
      );
      if (!one) throw new Error('not run');
      expect(Math.abs(one.found - one.reference.independent)).toBeLessThanOrEqual(
        allowance(one.reference),
      );
    });

  afterAll(() => {
    mkdirSync('test/out', { recursive: true });
    writeFileSync('test/out/fabric-cases.md', table());
  });
});

function table(): string {
  const rows = results.map(({ choice, reference, found }) => {
    const { low, high, sure, independent } = reference;
    const inside = Number.isNaN(low)
      ? '–'
      : found >= low && found <= high
        ? 'inside'
        : found < low
          ? `${(found - low).toFixed(3)}`
          : `+${(found - high).toFixed(3)}`;
    const gap = reference.quantity.endsWith(', C')
      ? `${(found - independent).toFixed(2)} K`
      : `${((found / independent - 1) * 100).toFixed(1)} %`;
    return `| ${reference.case} | ${reference.quantity} | ${choice} | ${found.toFixed(3)} | ${Number.isNaN(low) ? '–' : `${low} to ${high}`} (${sure}) | ${inside} | ${independent} | ${gap} |`;
  });
  return [
    '# Fabric cases, as the test found them',
    '',
    '| case | quantity | physics | found | remembered range | range | independent | gap |',
    '| --- | --- | --- | --- | --- | --- | --- | --- |',
    ...rows,
    '',
  ].join('\n');
}
