// Is the weather table the one that the project was made with? The project holds its SHA-256.

import type { Building } from '../../engine/index.ts';
import type { Fault } from '../../weather/index.ts';

export type DigestCheck =
  | { readonly kind: 'same' }
  /** Nothing to compare with; the text is an assumption for the results. */
  | { readonly kind: 'unknown'; readonly note: string }
  | { readonly kind: 'different'; readonly fault: Fault };

/**
 * Compares what was read with what the project expects.
 *
 * @param projectFile name of the project file, for the fault
 * @param sha256 of the bytes read, in hexadecimal
 */
export function checkWeatherDigest(
  building: Building,
  projectFile: string,
  sha256: string,
): DigestCheck {
  const source = building.weather;
  if (source?.sha256 === undefined) {
    const file = source?.file ?? 'the table';
    return {
      kind: 'unknown',
      note: `The project holds no SHA-256 of its weather; ${file} was taken as it is (${sha256}).`,
    };
  }
  if (source.sha256 === sha256) return { kind: 'same' };
  return {
    kind: 'different',
    fault: {
      file: projectFile,
      place: { path: 'weather.sha256' },
      found: source.sha256,
      expected: `${sha256}, the SHA-256 of ${source.file} as it is now`,
      mend: 'Put the table back that the project was made with, or write the new value here if the new table is meant.',
    },
  };
}
