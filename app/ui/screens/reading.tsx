import { figure } from '../format/index.ts';
import type { Simulation } from '../simulation.ts';

/** One line of what was found in the table. */
export function ReadingFacts({ simulation }: { simulation: Simulation }) {
  const { weather } = simulation.findings;
  const count = (kind: 'repair' | 'assumption') =>
    weather.repairs.filter((one) => one.kind === kind).reduce((sum, one) => sum + one.count, 0);
  const facts: readonly (readonly [string, string])[] = [
    ['Place', weather.place],
    ['Form', weather.form],
    ['Calendar', String(simulation.year)],
    ['Hours', figure(weather.hours)],
    ['Values repaired', figure(count('repair'))],
    ['Values assumed', figure(count('assumption'))],
  ];
  return (
    <dl className="facts">
      {facts.map(([name, value]) => (
        <div key={name}>
          <dt>{name}</dt>
          <dd>{value}</dd>
        </div>
      ))}
    </dl>
  );
}

/** Everything that was mended or assumed, in one list; nothing is hidden. */
export function ReadingNotes({ simulation }: { simulation: Simulation }) {
  const { weather, assumptions } = simulation.findings;
  const weatherNotes = weather.repairs;
  const repairs = weatherNotes.filter((one) => one.kind === 'repair');
  const assumed = weatherNotes.filter((one) => one.kind === 'assumption');
  return (
    <div className="notes">
      <section aria-label="Repairs">
        <h2>Repairs</h2>
        {repairs.length === 0 && <p className="quiet">None: the table was whole.</p>}
        <ul>
          {repairs.map((one) => (
            <li key={one.text}>
              <span>{one.text}</span> <i>{figure(one.count)} values</i>
            </li>
          ))}
        </ul>
      </section>
      <section aria-label="Assumptions">
        <h2>Assumptions</h2>
        {assumed.length + assumptions.length === 0 && <p className="quiet">None.</p>}
        <ul>
          {assumed.map((one) => (
            <li key={one.text}>
              <span>{one.text}</span> <i>{figure(one.count)} values</i>
            </li>
          ))}
          {assumptions.map((text) => (
            <li key={text}>{text}</li>
          ))}
        </ul>
      </section>
    </div>
  );
}
