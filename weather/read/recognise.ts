// Which form a file has, told by its first lines: never by its name.
import Papa from 'papaparse';
import { FaultList } from './fault-list.ts';
import { type Form, type Head, headingKey } from './form.ts';
import { plain } from './form-plain.ts';
import { psm } from './form-psm.ts';
import { pvgis } from './form-pvgis.ts';
import { tmy3 } from './form-tmy3.ts';

const forms: readonly Form[] = [tmy3, pvgis, psm, plain];
const delimiters = [',', ';', '\t', '|'];

/** Lines among which the headings must come. */
export const linesSearched = 120;

export interface Recognised {
  readonly form: Form;
  readonly head: Head;
}

/** Finds the headings, or adds the fault that says why there are none. */
export function recognise(
  file: string,
  lines: readonly string[],
  faults: FaultList,
): Recognised | null {
  for (let i = 0; i < Math.min(lines.length, linesSearched); i++) {
    for (const delimiter of delimiters) {
      if (!lines[i].includes(delimiter)) continue;
      const headings = (Papa.parse<string[]>(lines[i], { delimiter }).data[0] ?? []).map((cell) =>
        cell.replace(/^\uFEFF/, '').trim(),
      );
      const keys = headings.map(headingKey);
      const form = forms.find((one) => one.recognises(keys));
      if (form === undefined || lines[i].startsWith('#')) continue;
      return { form, head: { file, preamble: lines.slice(0, i), row: i + 1, headings, delimiter } };
    }
  }
  const text = lines.join('\n');
  const complaint = notText(text);
  if (complaint !== null)
    faults.whole(complaint.found, 'a weather table as text (CSV)', complaint.mend);
  else if (text.trim() === '')
    faults.whole('an empty file', 'a weather table', 'Choose a file that holds the table.');
  else
    faults.cell(
      1,
      'first line',
      lines.find((line) => line.trim() !== '') ?? '',
      'headings of TMY3, NSRDB PSM, PVGIS TMY or a plain table, separated by commas, semicolons or tabs',
      'Choose a weather table of one of these forms, or have a mapping made for it (--make-mapping on the command line).',
    );
  return null;
}

/** Name of the form whose headings stand in these first lines, or null. */
export function knownForm(lines: readonly string[]): string | null {
  return recognise('', lines.slice(0, linesSearched), new FaultList(''))?.form.name ?? null;
}

/** Why these first characters are not a text, or `null`. */
export function notText(text: string): { found: string; mend: string } | null {
  const start = text.slice(0, 4096);
  if (start.startsWith('PK\u0003\u0004'))
    return {
      found: 'a zip archive or a spreadsheet file',
      mend: 'Unpack it, or save the sheet as CSV from the spreadsheet program.',
    };
  let odd = 0;
  for (let i = 0; i < start.length; i++) {
    const code = start.charCodeAt(i);
    if (code < 32 && code !== 9 && code !== 10 && code !== 12 && code !== 13) odd++;
  }
  if (odd > start.length / 200)
    return {
      found: 'a binary file, or text in an encoding that was not understood',
      mend: 'Save the table as CSV in UTF-8.',
    };
  return null;
}
