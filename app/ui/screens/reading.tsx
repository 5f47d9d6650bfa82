import { figure } from '../format/index.ts';
import type { Simulation } from '../simulation.ts';

/** `53.40° N` */
function degrees(value: number, positive: string, negative: string): string {
  return `${figure(Math.abs(value), 2)}° ${value < 0 ? negative : positive}`;
}

/** One line of what was found in the table. */
export function ReadingFacts({ simulation }: { simulation: Simulation }) {
  const { weather, findings } = simulation;
  const facts: (readonly [string, string])[] = [['Place', findings.weather.place]];
  if (weather) {
    const { site, form } = weather;
    facts.push(
      ['Latitude', degrees(site.latitudeDeg, 'N', 'S')],
      ['Longitude', degrees(site.longitudeDeg, 'E', 'W')],
      ['Elevation', `${figure(site.elevationM)} m`],
      [
        'Clock',
        `UTC ${site.utcOffsetH < 0 ? '\u2212' : '+'} ${figure(Math.abs(site.utcOffsetH), site.utcOffsetH % 1 ? 1 : 0)}`,
      ],
      ['Form', form],
    );
  }
  facts.push(
    ['Hours', figure(findings.weather.hours)],
    ['Repaired', figure(findings.weather.repairs)],
  );
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
  const { weatherNotes, assumptions } = simulation;
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
