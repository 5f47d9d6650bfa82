// Humidity limits that work against each other.
import type { Fault } from '../../weather/index.ts';
import type { Building } from './schema-project.ts';

/** Every fault in the moisture of rooms. References must be sound already. */
export function moistureFaults(building: Building, file: string): Fault[] {
  return building.rooms.flatMap(({ moisture }, i): Fault[] => {
    const low = moisture?.humidifier?.humidityAbove;
    const high = moisture?.dehumidifier?.humidityBelow;
    if (typeof low !== 'number' || typeof high !== 'number' || low <= high) return [];
    return [
      {
        file,
        place: { path: `rooms[${i}].moisture.dehumidifier.humidityBelow` },
        found: `${high}`,
        expected: `at least the humidifier's ${low}`,
        mend: 'Humidifier and dehumidifier would work against each other.',
      },
    ];
  });
}
