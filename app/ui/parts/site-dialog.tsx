// Where a table that does not say was measured, and the clock it is written in.

import { type FormEvent, useId, useState } from 'react';
import { useApp, useAppState } from '../state/index.ts';
import { NumberField, typedNumber } from './number-field.tsx';
import { SheetDialog } from './sheet-dialog.tsx';

const fields = [
  {
    key: 'latitudeDeg',
    label: 'Latitude',
    unit: '°',
    min: -90,
    max: 90,
    note: 'north is positive',
  },
  {
    key: 'longitudeDeg',
    label: 'Longitude',
    unit: '°',
    min: -180,
    max: 180,
    note: 'east is positive',
  },
  { key: 'elevationM', label: 'Elevation', unit: 'm', min: -450, max: 6000, note: 'above the sea' },
  {
    key: 'utcOffsetH',
    label: 'Clock',
    unit: 'h',
    min: -12,
    max: 14,
    note: 'standard time minus UTC',
  },
] as const;

export function SiteDialog() {
  const app = useApp();
  const known = useAppState((state) => state.site);
  const file = useAppState((state) => state.weather?.file ?? 'the weather table');
  const nameId = useId();
  const [name, setName] = useState(known?.name ?? '');
  const [drafts, setDrafts] = useState<Readonly<Record<string, string>>>(() =>
    Object.fromEntries(fields.map(({ key }) => [key, known ? String(known[key]) : ''])),
  );
  const close = () => app.set({ dialog: null });
  const typedOf = ({ key, min, max }: (typeof fields)[number]) =>
    typedNumber(drafts[key] ?? '', min, max);
  const isReady = fields.every((field) => !Number.isNaN(typedOf(field)));

  function submit(event: FormEvent) {
    event.preventDefault();
    if (!isReady) return;
    const [latitudeDeg, longitudeDeg, elevationM, utcOffsetH] = fields.map(typedOf);
    if (latitudeDeg === undefined || longitudeDeg === undefined) return;
    if (elevationM === undefined || utcOffsetH === undefined) return;
    app.giveSite({ name: name.trim(), latitudeDeg, longitudeDeg, elevationM, utcOffsetH });
  }

  return (
    <SheetDialog label="Site of the table" className="site-dialog" onClose={close}>
      <form onSubmit={submit}>
        <h2>Site of {file}</h2>
        <p className="quiet">
          The sun is placed by these. The project keeps them with the table that it names.
        </p>
        <div className="field">
          <label htmlFor={nameId}>Name</label>
          <input
            id={nameId}
            className="wide"
            value={name}
            onChange={(event) => setName(event.target.value)}
          />
        </div>
        {fields.map((field) => (
          <NumberField
            key={field.key}
            label={field.label}
            unit={field.unit}
            min={field.min}
            max={field.max}
            note={field.note}
            draft={drafts[field.key] ?? ''}
            onDraft={(draft) => setDrafts({ ...drafts, [field.key]: draft })}
          />
        ))}
        <div className="dialog-foot">
          <button type="button" className="button" onClick={close}>
            Leave
          </button>
          <button type="submit" className="button is-filled" disabled={!isReady}>
            Use this site
          </button>
        </div>
      </form>
    </SheetDialog>
  );
}
