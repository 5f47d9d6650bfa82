// Where the demo lies and what it is made of. Built, it runs from dist/; the files stay in demo/.
import { join } from 'node:path';

export interface Places {
  readonly demo: string;
  /** Results; not kept in git. */
  readonly out: string;
}

export const placesIn = (demo: string): Places => ({ demo, out: join(demo, 'out') });

export const weatherName = 'ostermere-weather.csv';
export const projectName = 'quillon-house.inglenook.json';
