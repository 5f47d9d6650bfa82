// The units in which tables give each quantity, and the way into SI.
import type { MappedQuantity } from './mapping.ts';

export interface Unit {
  /** As a mapping names it and a person reads it. */
  readonly name: string;
  /** SI = (cell + before) · scale; for energies per interval still to be divided by its seconds. */
  readonly scale: number;
  readonly before: number;
  /** Whether the cell is the energy of the interval: J/m² once scaled. */
  readonly isEnergy: boolean;
  /** How headings spell it, as `unitKey` writes it. */
  readonly spellings: readonly string[];
}

const unit = (
  name: string,
  scale: number,
  spellings: string,
  more: { readonly before?: number; readonly isEnergy?: boolean } = {},
): Unit => ({
  name,
  scale,
  before: more.before ?? 0,
  isEnergy: more.isEnergy ?? false,
  spellings: [unitKey(name), ...spellings.split(' ').filter(Boolean)],
});

/** A unit's text as it is compared: no blanks, no brackets, small, powers and signs plain. */
export function unitKey(text: string): string {
  return text
    .toLowerCase()
    .replace(/²/g, '2')
    .replace(/[\s()[\]{}^*·.'"_]/g, '')
    .replace(/[−–]/g, '-')
    .replace(/[º˚]/g, '°');
}

// The foot is 0.3048 m and the pound 0.45359237 kg by definition (international yard and pound, 1959).
const temperature: readonly Unit[] = [
  unit('°C', 1, 'c degc celsius °celsius gradc grad degrees degreescelsius degreesc'),
  unit('°F', 5 / 9, 'f degf fahrenheit degreesf degreesfahrenheit', { before: -32 }),
  unit('K', 1, 'kelvin', { before: -273.15 }),
  unit('0.1 °C', 0.1, '01c tenthsc tenthsofc 1/10c'),
];
const share: readonly Unit[] = [
  unit('%', 0.01, 'percent pct prozent prz v%'),
  unit('share', 1, '- 0-1 1 fraction'),
];
const pressure: readonly Unit[] = [
  unit('Pa', 1, 'pascal'),
  unit('hPa', 100, 'mbar mb millibar hectopascal'),
  unit('kPa', 1000, 'kilopascal'),
  unit('inHg', 3386.389, 'in.hg inhg inches inchhg inchesofmercury'), // conventional, ISO 80000-4
  unit('mmHg', 133.322387415, 'torr mm hgmm'),
];
const speed: readonly Unit[] = [
  unit('m/s', 1, 'ms mps ms-1 m/sec metres/second meter/sec'),
  unit('km/h', 1 / 3.6, 'kmh kph kmh-1 km/hr'),
  unit('mph', 0.44704, 'mi/h mi/hr'),
  unit('kn', 1852 / 3600, 'kt kts knots knoten'),
];
const radiation: readonly Unit[] = [
  unit('W/m²', 1, 'wm2 wm-2 w/m2 watt/m2 watts/m2 w/sqm w/qm'),
  unit('kW/m²', 1000, 'kwm2 kw/m2 kwm-2'),
  unit('Wh/m²', 3600, 'whm2 wh/m2 whm-2', { isEnergy: true }),
  unit('kWh/m²', 3.6e6, 'kwhm2 kwh/m2 kwhm-2', { isEnergy: true }),
  unit('J/m²', 1, 'jm2 j/m2 jm-2', { isEnergy: true }),
  unit('kJ/m²', 1000, 'kjm2 kj/m2 kjm-2 kj/m2h kj/m2/h kj/hm2', { isEnergy: true }),
  unit('MJ/m²', 1e6, 'mjm2 mj/m2 mjm-2 mj/m2h mj/m2/h', { isEnergy: true }),
  unit('J/cm²', 1e4, 'jcm2 j/cm2 jcm-2', { isEnergy: true }),
  unit('Btu/(h·ft²)', 3.154590745, 'btu/hft2 btu/h/ft2 btu/ft2h btuh/ft2 btu/hr/ft2'), // 1055.05585262 J
];
const cover: readonly Unit[] = [
  unit('share', 1, '- 0-1 1 fraction'),
  unit('tenths', 0.1, '1/10 10ths'),
  unit('eighths', 0.125, 'okta oktas 1/8 8ths achtel'),
  unit('%', 0.01, 'percent pct prozent'),
];
const height: readonly Unit[] = [
  unit('m', 1, 'metre metres meter meters'),
  unit('ft', 0.3048, 'feet foot'),
];

const table: Readonly<Record<MappedQuantity, readonly Unit[]>> = {
  dryBulbC: temperature,
  dewPointC: temperature,
  wetBulbC: temperature,
  relativeHumidity: share,
  humidityRatio: [unit('g/kg', 0.001, 'gkg gkg-1'), unit('kg/kg', 1, 'kgkg kgkg-1')],
  vapourPressurePa: pressure,
  pressurePa: pressure,
  seaLevelPressurePa: pressure,
  windMPerS: speed,
  windFromDeg: [unit('°', 1, 'deg degree degrees grad degn °n')],
  ghiWPerM2: radiation,
  dniWPerM2: radiation,
  dhiWPerM2: radiation,
  beamHorizontalWPerM2: radiation,
  horizontalInfraredWPerM2: radiation,
  skyCover: cover,
  opaqueSkyCover: cover,
  ceilingM: height,
  albedo: share,
};

/** The units that a quantity may come in, the commonest first. */
export function unitsOf(quantity: MappedQuantity): readonly Unit[] {
  return table[quantity];
}

export function unitNamed(quantity: MappedQuantity, name: string): Unit | undefined {
  return table[quantity].find((one) => one.name === name);
}

/** The unit that a text spells, if it is one of the quantity's. */
export function unitSpelt(quantity: MappedQuantity, text: string): Unit | undefined {
  const key = unitKey(text);
  return key === '' ? undefined : table[quantity].find((one) => one.spellings.includes(key));
}

/** Whether a text spells a unit of any quantity: tells a row of units from one of names. */
export function isUnitText(text: string): boolean {
  const key = unitKey(text);
  return (
    key !== '' && Object.values(table).some((all) => all.some((one) => one.spellings.includes(key)))
  );
}

/** SI value of a cell. @param intervalS length of the row's interval, for energies */
export function toSi(unitOfCell: Unit, cell: number, intervalS: number): number {
  const { scale, before, isEnergy } = unitOfCell;
  // Dividing by a whole number rounds as the decimal was meant: 0.85 from 85, not 85 · 0.01.
  const inverse = Math.round(1 / scale);
  const isWhole = scale < 1 && Math.abs(inverse * scale - 1) < 1e-12;
  const value = isWhole ? (cell + before) / inverse : (cell + before) * scale;
  return isEnergy ? value / intervalS : value;
}
