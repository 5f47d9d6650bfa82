// Where people live and sleep. Hour 0 to 1 first; a span ends at the hour it names.
import type { UsageProfile } from './types.ts';
import { day, hours, usage } from './usage-row.ts';

const homeLight = hours([6, 0], [8, 0.6], [17, 0.1], [22, 0.8], [23, 0.4], [24, 0.1]);
const homeEquipment = hours([6, 0.4], [8, 0.6], [17, 0.5], [22, 1], [24, 0.6]);
const workdayHome = hours([7, 1], [8, 0.5], [13, 0.1], [17, 0.2], [18, 0.5], [22, 0.8], [24, 1]);
const freeHome = hours([8, 1], [10, 0.8], [18, 0.6], [24, 0.9]);

const livingWork = hours([6, 0], [8, 0.5], [16, 0.1], [18, 0.4], [23, 1], [24, 0.2]);
const livingFree = hours([8, 0], [22, 0.7], [23, 1], [24, 0.2]);
const sleeping = hours([7, 1], [8, 0.5], [22, 0], [23, 0.5], [24, 1]);
const bedLight = hours([6, 0], [8, 0.5], [21, 0], [23, 0.7], [24, 0]);

const guest = hours([7, 0.8], [9, 0.5], [17, 0.1], [21, 0.3], [24, 0.7]);
const ward = hours([24, 0.9]);
const wardLight = hours([6, 0.1], [8, 0.7], [18, 0.5], [22, 0.8], [24, 0.1]);

export const homeUsages: readonly UsageProfile[] = [
  usage(
    'dwelling-house',
    'Dwelling, house as one room',
    {
      m2PerPerson: 42.5,
      activity: 'seated-work',
      lighting: 3,
      equipment: 2.4,
      heat: [20, 16],
      cool: [26, 32],
      air: [0, 0.42],
    },
    day(workdayHome, homeLight, homeEquipment),
    day(freeHome, homeLight, homeEquipment),
  ),
  usage(
    'dwelling-flat',
    'Dwelling, flat as one room',
    {
      m2PerPerson: 28.3,
      activity: 'seated-work',
      lighting: 3,
      equipment: 3,
      heat: [20, 16],
      cool: [26, 32],
      air: [0, 0.42],
    },
    day(workdayHome, homeLight, homeEquipment),
    day(freeHome, homeLight, homeEquipment),
  ),
  usage(
    'living-room',
    'Living room',
    {
      m2PerPerson: 12,
      activity: 'seated',
      lighting: 5,
      equipment: 5,
      heat: [20, 16],
      cool: [26, 32],
      air: [0, 0.42],
    },
    day(livingWork, homeLight, homeEquipment),
    day(livingFree, homeLight, homeEquipment),
  ),
  usage(
    'bedroom',
    'Bedroom',
    {
      m2PerPerson: 8,
      activity: 'sleeping',
      lighting: 3,
      equipment: 1,
      heat: [18, 16],
      cool: [26, 32],
      air: [0, 0.42],
    },
    day(sleeping, bedLight, hours([7, 0.2], [22, 0.2], [24, 1])),
    day(sleeping, bedLight, hours([7, 0.2], [22, 0.2], [24, 1])),
  ),
  usage(
    'hotel-room',
    'Hotel room',
    {
      m2PerPerson: 12,
      activity: 'reclining',
      lighting: 6,
      equipment: 3,
      heat: [21, 18],
      cool: [25, 30],
    },
    day(guest, bedLight, hours([7, 0.3], [9, 0.6], [17, 0.2], [24, 0.8])),
    day(guest, bedLight, hours([7, 0.3], [9, 0.6], [17, 0.2], [24, 0.8])),
  ),
  usage(
    'care-room',
    'Care home or ward room',
    {
      m2PerPerson: 10,
      activity: 'reclining',
      lighting: 7,
      equipment: 4,
      heat: [22, 21],
      cool: [25, 26],
    },
    day(ward, wardLight, hours([24, 0.6])),
    day(ward, wardLight, hours([24, 0.6])),
  ),
];
