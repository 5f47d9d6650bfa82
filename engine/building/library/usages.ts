// All generic usage profiles.
import type { UsageProfile } from './types.ts';
import { homeUsages } from './usage-home.ts';
import { publicUsages } from './usage-public.ts';
import { workUsages } from './usage-work.ts';

export const libraryUsages: readonly UsageProfile[] = [
  ...homeUsages,
  ...workUsages,
  ...publicUsages,
];
