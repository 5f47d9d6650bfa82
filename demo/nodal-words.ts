// What the two nodal models of the demo found, each in a sentence.
import type { NodalResults } from '../app/cli/nodal.ts';

function named<T>(list: readonly T[], of: (one: T) => string, name: string): T {
  const found = list.find((one) => of(one) === name);
  if (!found) throw new Error(`the model has nothing named "${name}"`);
  return found;
}

const node = ({ nodes }: NodalResults, id: string) => named(nodes, (one) => one.id, id);
const flow = ({ flows }: NodalResults, name: string) => named(flows, (one) => one.name, name);
const degrees = (value: number) => `${value.toFixed(1)} °C`.replace('-', '\u2212');

export function loftTankWords(results: NodalResults): string {
  const wet = ['pipe-1', 'pipe-2', 'pipe-3', 'tank'].map((id) => node(results, id));
  const frozen = wet.filter(({ minC }) => minC < 0);
  const where = frozen.map(({ name, minC }) => `${name} (${degrees(minC)})`).join('; ');
  const heat = flow(results, 'trace heater on the eaves pipe');
  const ice =
    frozen.length === 0
      ? 'no water reaches 0 °C.'
      : `ice begins in: ${where}. Frost protection is a matter for a licensed practitioner.`;
  return `${results.model}: the tank falls to ${degrees(node(results, 'tank').minC)}, the trace heater gives ${heat.totalKWh.toFixed(2)} kWh, and ${ice}`;
}

export function solarWallWords(results: NodalResults): string {
  const water = flow(results, 'plate to water').totalKWh;
  const backUp = flow(results, 'back-up heater of the workshop').totalKWh;
  const top = node(results, 'store-top');
  return `${results.model}: the wall gives its water ${water.toFixed(1)} kWh in four March days, the store reaches ${degrees(top.maxC)}, and the workshop's back-up heater still gives ${backUp.toFixed(1)} kWh.`;
}
