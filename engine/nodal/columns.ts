// Columns of a model's table brought to the steps of its run.
import type { NumberTable } from '../../weather/index.ts';
import type { Series } from '../network/index.ts';
import type { NodalModel } from './schema.ts';

/**
 * A column as a series. Means are held (steps inside a row) or averaged (rows inside a step); readings
 * are joined by straight lines. Past the last row the table begins again.
 */
export function columnSeries(model: NodalModel, table: NumberTable, name: string): Series {
  const values = table.columns.get(name);
  if (!values || !model.table) throw new Error(`the parser let the unknown column "${name}" pass`);
  const { stepS, stepCount } = model.time;
  const { rowS, stands } = model.table;
  const rows = values.length;
  if (stands === 'reading') {
    const at = (k: number) => {
      const x = (k * stepS) / rowS;
      const i = Math.floor(x + 1e-9);
      const before = values[i % rows];
      return before + Math.max(0, x - i) * (values[(i + 1) % rows] - before);
    };
    return {
      name,
      hold: 'linear',
      values: Float64Array.from({ length: stepCount + 1 }, (_, k) => at(k)),
    };
  }
  const mean = (k: number) => {
    const from = (k * stepS) / rowS;
    const to = ((k + 1) * stepS) / rowS;
    let sum = 0;
    for (let i = Math.floor(from + 1e-9); i < to - 1e-9; i++)
      sum += values[i % rows] * (Math.min(to, i + 1) - Math.max(from, i));
    return sum / (to - from);
  };
  return {
    name,
    hold: 'step',
    values: Float64Array.from({ length: stepCount }, (_, k) => mean(k)),
  };
}
