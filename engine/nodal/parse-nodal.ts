// Text of a nodal model and of its table → Problem, or every fault in them.
import type { Fault, NumberTable, Parsed } from '../../weather/index.ts';
import { schemaFaults } from '../building/index.ts';
import { checkNetwork, type Problem } from '../network/index.ts';
import { nodalProblem } from './nodal-problem.ts';
import { type NodalModel, nodalSchema } from './schema.ts';

/** Whether a JSON document says that it is a nodal model. */
export function isNodalModel(document: unknown): boolean {
  return (
    typeof document === 'object' &&
    document !== null &&
    Reflect.get(document, 'format') === 'inglenook-network'
  );
}

/** The model alone: its table is still to be read. */
export function parseNodalModel(document: unknown, file: string): Parsed<NodalModel> {
  const parsed = nodalSchema.safeParse(document);
  if (!parsed.success) return { ok: false, faults: schemaFaults(parsed.error, document, file) };
  const faults = referenceFaults(parsed.data, file);
  return faults.length > 0 ? { ok: false, faults } : { ok: true, value: parsed.data };
}

/** The model with its table as a problem for the solver; what the network's own checks find is a fault. */
export function parseNodalProblem(
  model: NodalModel,
  table: NumberTable | null,
  file: string,
): Parsed<Problem> {
  const faults: Fault[] = [];
  for (const { column, path } of columnsUsed(model))
    if (!table?.columns.has(column))
      faults.push({
        file,
        place: { path },
        found: `the column "${column}"`,
        expected: table
          ? `one of the table's columns: ${[...table.columns.keys()].join(', ')}`
          : 'a model with a table',
        mend: table ? 'Correct the name.' : 'Add "table" to the model, or give a number.',
      });
  if (faults.length > 0) return { ok: false, faults };
  const problem = nodalProblem(model, table);
  const breaches = checkNetwork(problem);
  return breaches.length > 0
    ? {
        ok: false,
        faults: breaches.map((breach) => ({
          file,
          place: { path: breach.nodes.join(', ') },
          found: breach.text,
          expected: 'a network that can be solved',
          mend: 'Correct the nodes and links named.',
        })),
      }
    : { ok: true, value: problem };
}

function referenceFaults(model: NodalModel, file: string): Fault[] {
  const faults: Fault[] = [];
  const add = (path: string, found: string, expected: string, mend: string) =>
    faults.push({ file, place: { path }, found, expected, mend });
  const ids = new Set<string>();
  model.nodes.forEach((node, i) => {
    if (ids.has(node.id))
      add(`nodes[${i}].id`, `"${node.id}" again`, 'an id used once', 'Rename it.');
    ids.add(node.id);
    if (
      'capacityJPerK' in node &&
      node.capacityJPerK > 0 &&
      node.startC === undefined &&
      model.time.start === 'given'
    )
      add(
        `nodes[${i}].startC`,
        'nothing',
        'the temperature it starts from',
        'Give startC, or set time.start to "steady".',
      );
  });
  const refer = (node: string, path: string) => {
    if (!ids.has(node))
      add(path, `"${node}"`, 'the id of a node', 'Define the node or correct the name.');
  };
  const lists = [
    ['links', model.links],
    ['directedLinks', model.directedLinks],
  ] as const;
  for (const [name, list] of lists)
    list.forEach((link, i) => {
      refer(link.from, `${name}[${i}].from`);
      refer(link.to, `${name}[${i}].to`);
      if (link.from === link.to)
        add(
          `${name}[${i}].to`,
          `"${link.to}" at both ends`,
          'two different nodes',
          'Correct one end.',
        );
    });
  model.sources.forEach((source, i) => {
    refer(source.node, `sources[${i}].node`);
  });
  model.controls.forEach((control, i) => {
    refer(control.node, `controls[${i}].node`);
    refer(control.sensor, `controls[${i}].sensor`);
  });
  return faults;
}

function columnsUsed(model: NodalModel): { column: string; path: string }[] {
  const used: { column: string; path: string }[] = [];
  const note = (value: unknown, path: string) => {
    if (typeof value === 'object' && value !== null) {
      const column: unknown = Reflect.get(value, 'column');
      if (typeof column === 'string') used.push({ column, path });
    } else if (typeof value === 'string') used.push({ column: value, path });
  };
  model.nodes.forEach((node, i) => {
    if ('boundaryC' in node) note(node.boundaryC, `nodes[${i}].boundaryC`);
  });
  model.links.forEach((link, i) => {
    if ('conductanceWPerK' in link) note(link.conductanceWPerK, `links[${i}].conductanceWPerK`);
  });
  model.directedLinks.forEach((link, i) => {
    note(link.column, `directedLinks[${i}].column`);
  });
  model.sources.forEach((source, i) => {
    note(source.column, `sources[${i}].column`);
  });
  model.controls.forEach((control, i) => {
    note(control.setPointC, `controls[${i}].setPointC`);
    note(control.maxW, `controls[${i}].maxW`);
  });
  return used;
}
