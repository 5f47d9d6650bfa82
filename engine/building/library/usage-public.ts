// Shops, meals, sport, and rooms that people pass through.
import type { UsageProfile } from './types.ts';
import { day, emptyDay, hours, usage } from './usage-row.ts';

const shop = hours([8, 0], [10, 0.3], [12, 0.6], [16, 0.7], [19, 1], [20, 0.5], [24, 0]);
const shopLight = hours([8, 0.05], [20, 1], [24, 0.05]);
const meals = hours(
  [11, 0],
  [12, 0.3],
  [14, 0.9],
  [17, 0.2],
  [18, 0.4],
  [21, 0.9],
  [23, 0.5],
  [24, 0],
);
const mealLight = hours([10, 0], [23, 1], [24, 0.2]);
const cooking = hours([9, 0.1], [11, 0.6], [14, 1], [17, 0.3], [21, 1], [22, 0.4], [24, 0.1]);
const sport = hours([8, 0], [12, 0.4], [14, 0.2], [17, 0.6], [21, 1], [22, 0.5], [24, 0]);
const passing = hours([7, 0], [18, 0.3], [24, 0]);

export const publicUsages: readonly UsageProfile[] = [
  usage(
    'shop',
    'Shop',
    {
      m2PerPerson: 15,
      activity: 'standing-light',
      lighting: 14,
      equipment: 3,
      heat: [19, 15],
      cool: [25, 32],
    },
    day(shop, shopLight, shopLight),
    day(shop, shopLight, shopLight),
  ),
  usage(
    'restaurant',
    'Restaurant',
    {
      m2PerPerson: 1.5,
      activity: 'seated-work',
      lighting: 9,
      equipment: 4,
      heat: [20, 16],
      cool: [26, 32],
    },
    day(meals, mealLight, meals),
    day(meals, mealLight, meals),
  ),
  usage(
    'kitchen-commercial',
    'Kitchen of a restaurant',
    {
      m2PerPerson: 10,
      activity: 'standing-medium',
      lighting: 12,
      equipment: 120,
      heat: [18, 12],
      cool: [28, 35],
    },
    day(cooking, hours([8, 0], [23, 1], [24, 0]), cooking),
    day(cooking, hours([8, 0], [23, 1], [24, 0]), cooking),
  ),
  usage(
    'sports-hall',
    'Sports hall',
    {
      m2PerPerson: 20,
      activity: 'exercise',
      lighting: 9,
      equipment: 0,
      heat: [17, 12],
      cool: [26, 32],
    },
    day(sport, sport, hours([24, 0])),
    day(sport, sport, hours([24, 0])),
  ),
  usage(
    'corridor',
    'Corridor and stairs',
    {
      m2PerPerson: 50,
      activity: 'walking-3-km-per-h',
      lighting: 5,
      equipment: 0,
      heat: [16, 12],
      cool: [30, 35],
      air: [0, 0.35],
    },
    day(passing, hours([7, 0.1], [18, 1], [24, 0.1]), hours([24, 0])),
    emptyDay(0),
  ),
  usage(
    'storage',
    'Storage, hardly entered',
    {
      m2PerPerson: 100,
      activity: 'walking-3-km-per-h',
      lighting: 4,
      equipment: 0,
      heat: [12, 8],
      cool: [32, 38],
      air: [0, 0.2],
    },
    day(hours([8, 0], [17, 0.1], [24, 0]), hours([8, 0], [17, 0.2], [24, 0]), hours([24, 0])),
    emptyDay(0),
  ),
];
