// The schema library's complaints in the words of this program: place, found, expected, mend.
import type { z } from 'zod';
import type { Fault } from '../../weather/index.ts';
import { pathText, shown, valueAt } from './json-place.ts';

/** One fault for each thing that does not fit the schema. */
export function schemaFaults(error: z.ZodError, document: unknown, file: string): Fault[] {
  return error.issues.flatMap((issue) => issueFaults(issue, document, file, []));
}

type Issue = z.core.$ZodIssue;

function issueFaults(
  issue: Issue,
  document: unknown,
  file: string,
  before: readonly PropertyKey[],
): Fault[] {
  const path = [...before, ...issue.path];
  const value = valueAt(document, path);
  const fault = (at: readonly PropertyKey[], found: string, expected: string, mend: string) => ({
    file,
    place: { path: pathText(at) },
    found,
    expected,
    mend,
  });
  switch (issue.code) {
    case 'unrecognized_keys':
      return issue.keys.map((key) =>
        fault(
          [...path, key],
          `the unknown field "${key}"`,
          'a field of this format',
          'Check its spelling and its unit suffix, or take it out.',
        ),
      );
    case 'invalid_union': {
      const branch = nearestBranch(issue);
      if (branch) return branch.flatMap((inner) => issueFaults(inner, document, file, path));
      return [fault(path, shown(value), unionText(issue), 'Write it in one of these forms.')];
    }
    case 'too_small':
    case 'too_big': {
      const low = issue.code === 'too_small';
      const limit = String(low ? issue.minimum : issue.maximum);
      const counted = issue.origin === 'array' || issue.origin === 'string';
      const noun = issue.origin === 'array' ? ' entries' : ' characters';
      const word = low ? (issue.inclusive ? 'at least' : 'more than') : 'at most';
      const expected = counted ? `${word} ${limit}${noun}` : `a number of ${word} ${limit}`;
      return [fault(path, shown(value), expected, 'Put a value inside the limits.')];
    }
    case 'invalid_type':
      return value === undefined
        ? [fault(path, 'nothing', typeText(issue.expected), 'Add the field.')]
        : [fault(path, shown(value), typeText(issue.expected), 'Correct the value.')];
    case 'invalid_value':
      return [
        fault(
          path,
          shown(value),
          issue.values.length === 1
            ? shown(issue.values[0])
            : `one of ${issue.values.map((v) => shown(v)).join(', ')}`,
          'Choose one of them.',
        ),
      ];
    default:
      return [fault(path, shown(value), issue.message, 'Correct the value.')];
  }
}

/** The branch of a union that came closest: the one with the fewest complaints below its own level. */
function nearestBranch(issue: Extract<Issue, { code: 'invalid_union' }>): Issue[] | undefined {
  const branches = issue.errors.filter((inner) => inner.some((one) => one.path.length > 0));
  const typed = branches.filter((inner) => !inner.some((one) => one.code === 'unrecognized_keys'));
  const pool = typed.length > 0 ? typed : branches;
  return [...pool].sort((a, b) => a.length - b.length)[0] as Issue[] | undefined;
}

function unionText(issue: Extract<Issue, { code: 'invalid_union' }>): string {
  const forms = issue.errors
    .flat()
    .map((one) => (one.code === 'invalid_type' ? typeText(one.expected) : one.message));
  const unique = [...new Set(forms)];
  return unique.length > 0 ? unique.join(' or ') : 'a known kind';
}

function typeText(type: string): string {
  const names: Record<string, string> = {
    number: 'a number',
    int: 'a whole number',
    string: 'text in quotes',
    boolean: 'true or false',
    array: 'a list [ … ]',
    object: 'an object { … }',
    tuple: 'a list [ … ]',
  };
  return names[type] ?? type;
}
