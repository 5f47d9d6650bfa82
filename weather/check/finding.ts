// What is doubtful in a table: where, how often, and what could be done about it.
import type { MappedQuantity } from '../map/mapping.ts';

export interface Place {
  /** First step of the series and how many. */
  readonly from: number;
  readonly count: number;
  /** Row in the file; 0 where the file has none. */
  readonly row: number;
  /** Local standard time. */
  readonly when: string;
}

export type FindingKind =
  | 'order'
  | 'duplicates'
  | 'off-grid'
  | 'summer-time'
  | 'leap-day'
  | 'offset'
  | 'range'
  | 'gap-short'
  | 'gap-long'
  | 'gap-too-long'
  | 'absent'
  | 'stuck'
  | 'spike'
  | 'jump'
  | 'closure'
  | 'above-clear'
  | 'night-sun'
  | 'sun-time'
  | 'sun-season'
  | 'outside-run';

export interface Finding {
  /** Stable for a file and a mapping: what is accepted is named by it. */
  readonly id: string;
  readonly kind: FindingKind;
  readonly quantity: MappedQuantity | null;
  /** `note`: nothing to do. `doubt`: may be left. `blocks`: no year can be taken before it is settled. */
  readonly level: 'note' | 'doubt' | 'blocks';
  readonly title: string;
  /** What was found, as a sentence. */
  readonly text: string;
  /** Steps that it touches, and where; the first of them only. */
  readonly count: number;
  readonly places: readonly Place[];
  /** What would be done, as a sentence; null: nothing can. */
  readonly repair: string | null;
  readonly isAccepted: boolean;
}

/** Places listed for one finding. */
export const mostPlaces = 12;

/** Which repairs a person has accepted: by id, or all that are proposed. */
export type Accepted = ReadonlySet<string> | 'all';

export function isAccepted(accepted: Accepted, id: string, repair: string | null): boolean {
  return repair !== null && (accepted === 'all' || accepted.has(id));
}
