// Where people work and learn. Hour 0 to 1 first; a span ends at the hour it names.
import type { UsageProfile } from './types.ts';
import { day, emptyDay, hours, usage } from './usage-row.ts';

const office = hours(
  [7, 0],
  [8, 0.2],
  [9, 0.6],
  [12, 0.7],
  [13, 0.4],
  [17, 0.7],
  [18, 0.2],
  [24, 0],
);
const officeLight = hours([7, 0], [8, 0.5], [17, 1], [18, 0.5], [24, 0]);
const officeEquipment = hours(
  [7, 0.1],
  [8, 0.3],
  [12, 0.8],
  [13, 0.6],
  [17, 0.8],
  [18, 0.3],
  [24, 0.1],
);

const meetings = hours([8, 0], [9, 0.5], [12, 0.8], [13, 0], [16, 0.8], [17, 0.4], [24, 0]);
const lessons = hours([8, 0], [10, 0.9], [11, 0.5], [13, 0.9], [14, 0.3], [16, 0.5], [24, 0]);
const lessonLight = hours([7, 0], [8, 0.5], [16, 0.9], [17, 0.3], [24, 0]);
const nursery = hours([7, 0], [8, 0.4], [9, 0.8], [13, 0.9], [15, 0.7], [17, 0.4], [24, 0]);
const audience = hours([8, 0], [12, 0.7], [13, 0.2], [18, 0.7], [24, 0]);
const shift = hours([6, 0], [9, 1], [10, 0.7], [12, 1], [13, 0.5], [15, 1], [24, 0]);
const reading = hours([9, 0], [11, 0.4], [18, 0.8], [20, 0.4], [24, 0]);

const offices = { heat: [20, 16], cool: [26, 32] } as const;

export const workUsages: readonly UsageProfile[] = [
  usage(
    'office-single',
    'Office, one or two people',
    { m2PerPerson: 10, activity: 'seated-work', lighting: 8, equipment: 12, ...offices },
    day(office, officeLight, officeEquipment),
    emptyDay(0.1),
  ),
  usage(
    'office-open',
    'Office, open plan',
    { m2PerPerson: 15, activity: 'seated-work', lighting: 8, equipment: 12, ...offices },
    day(office, officeLight, officeEquipment),
    emptyDay(0.1),
  ),
  usage(
    'meeting-room',
    'Meeting room',
    { m2PerPerson: 2, activity: 'seated-work', lighting: 9, equipment: 6, ...offices },
    day(meetings, meetings, meetings),
    emptyDay(0),
  ),
  usage(
    'classroom',
    'Classroom',
    { m2PerPerson: 2, activity: 'seated-work', lighting: 8, equipment: 4, ...offices },
    day(lessons, lessonLight, lessons),
    emptyDay(0.05),
  ),
  usage(
    'nursery',
    'Nursery',
    {
      m2PerPerson: 3.8,
      activity: 'standing-light',
      lighting: 8,
      equipment: 2,
      heat: [21, 17],
      cool: [25, 30],
    },
    day(nursery, lessonLight, nursery),
    emptyDay(0),
  ),
  usage(
    'auditorium',
    'Auditorium',
    { m2PerPerson: 1, activity: 'seated', lighting: 10, equipment: 4, ...offices },
    day(audience, audience, audience),
    emptyDay(0.05),
  ),
  usage(
    'library-reading',
    'Library, reading room',
    { m2PerPerson: 5, activity: 'seated-work', lighting: 9, equipment: 4, ...offices },
    day(reading, hours([8, 0], [20, 1], [24, 0]), reading),
    day(reading, hours([8, 0], [20, 1], [24, 0]), reading),
  ),
  usage(
    'workshop-light',
    'Workshop, light work',
    {
      m2PerPerson: 20,
      activity: 'standing-medium',
      lighting: 10,
      equipment: 20,
      heat: [18, 12],
      cool: [28, 35],
    },
    day(shift, hours([6, 0], [15, 1], [24, 0]), shift),
    emptyDay(0.05),
  ),
];
