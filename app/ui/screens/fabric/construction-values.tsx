// What a construction is worth, in one row: U, capacity, decrement, time shift, surface factor, damp.

import type { ReactNode } from 'react';
import type {
  ConstructionExplained,
  ConstructionSection,
  ConstructionUse,
} from '../../../../engine/index.ts';
import { figure } from '../../format/index.ts';

export interface ConstructionValuesProps {
  readonly explained: ConstructionExplained;
  readonly use: ConstructionUse;
  readonly section: ConstructionSection;
}

function Value({
  name,
  unit,
  note,
  children,
}: {
  readonly name: string;
  readonly unit?: string;
  readonly note: string;
  readonly children: ReactNode;
}) {
  return (
    <div>
      <dt>{name}</dt>
      <dd>
        <b>{children}</b> {unit && <span>{unit}</span>}
        <span className="note">{note}</span>
      </dd>
    </div>
  );
}

const ways = { up: 'heat upward', horizontal: 'heat sideways', down: 'heat downward' } as const;

export function ConstructionValues({ explained, use, section }: ConstructionValuesProps) {
  const { uValueWPerM2K, decrementFactor, timeShiftH, insideCapacityJPerM2K, surfaceFactor } = use;
  const damp = dampWords(section);
  return (
    <dl className="values">
      <Value name="U-value" unit="W/(m²·K)" note={ways[use.heatFlow]}>
        {figure(uValueWPerM2K, 2)}
      </Value>
      <Value
        name="Heat capacity, inside"
        unit="kJ/(m²·K)"
        note={`${figure(explained.massKgPerM2)} kg/m² in all`}
      >
        {figure(insideCapacityJPerM2K / 1000)}
      </Value>
      <Value name="Decrement factor" note="of a day's swing">
        {figure(decrementFactor, 2)}
      </Value>
      <Value name="Time shift" unit="h" note="outside to inside">
        {figure(timeShiftH, 1)}
      </Value>
      <Value name="Surface factor" note="mould limit 0.70">
        {surfaceFactor === null ? '–' : figure(surfaceFactor, 2)}
      </Value>
      <div className={damp.isDamp ? 'is-warning' : ''}>
        <dt>Condensation</dt>
        <dd>
          <b>{damp.title}</b>
          <span className="note">{damp.note}</span>
        </dd>
      </div>
    </dl>
  );
}

/** For the conditions drawn; not a count over the year. */
function dampWords({ layers, vapourUnknown, innerFaceC, insideDewPointC }: ConstructionSection) {
  if (innerFaceC <= insideDewPointC) {
    return { isDamp: true, title: 'on its face', note: 'as drawn' };
  }
  if (vapourUnknown.length > 0) {
    return { isDamp: false, title: '–', note: 'vapour factor lacking' };
  }
  for (const { name, outerC, innerC, dewPointC } of layers) {
    const wet = dewPointC?.some((dew, p) => {
      const share = p / (dewPointC.length - 1);
      return dew > outerC + share * (innerC - outerC) + 1e-6;
    });
    if (wet)
      return { isDamp: true, title: 'inside it', note: `in ${name.toLowerCase()}, as drawn` };
  }
  return { isDamp: false, title: 'none', note: 'as drawn' };
}
