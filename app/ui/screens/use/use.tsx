// When and how much: a schedule with its painted day, or the gains and comfort of every room.

import { useState } from 'react';
import type { Building } from '../../../../engine/index.ts';
import {
  type DayKind,
  dayEdit,
  nameOf,
  newSchedule,
  ownDayProfile,
  type ProjectForm,
  profileEdit,
  type ScheduleForm,
  scheduleFieldEdit,
} from '../../../project/index.ts';
import { Choice } from '../../parts/choice.tsx';
import { TextCell } from '../../parts/text-cell.tsx';
import { useApp, useAppState, useEditedProject } from '../../state/index.ts';
import { DayPainter } from './day-painter.tsx';
import { GainTables } from './gain-tables.tsx';
import { Periods } from './periods.tsx';

export function Use() {
  const app = useApp();
  const project = useEditedProject();
  const chosen = useAppState((state) => state.chosen.use);
  if (!project) return null;
  const { form, building } = project;
  const schedule = building.schedules.find(({ id }) => id === chosen);
  if (schedule)
    return <ScheduleSheet key={schedule.id} form={form} building={building} schedule={schedule} />;
  return (
    <>
      <div className="sheet-head">
        <h1>Use</h1>
        <span className="quiet">
          what people, light and equipment give off, and the comfort band
        </span>
        <span className="sheet-acts">
          <button
            type="button"
            className="button"
            onClick={() => {
              const { id, edit } = newSchedule(building, undefined);
              app.edit(edit);
              app.choose('use', id);
            }}
          >
            Add schedule
          </button>
        </span>
      </div>
      <GainTables form={form} building={building} />
    </>
  );
}

interface ScheduleSheetProps {
  readonly form: ProjectForm;
  readonly building: Building;
  readonly schedule: Building['schedules'][number] & ScheduleForm;
}

const days: readonly (readonly [DayKind, string])[] = [
  ['profile', 'Weekdays'],
  ['saturday', 'Saturday'],
  ['sunday', 'Sunday'],
  ['holiday', 'Holidays'],
];

function ScheduleSheet({ form, building, schedule }: ScheduleSheetProps) {
  const app = useApp();
  const [day, setDay] = useState<DayKind>('profile');
  const profileId = schedule[day] ?? schedule.profile;
  const profile = building.profiles.find(({ id }) => id === profileId);
  const sharers = building.schedules.filter(
    (one) => one.id !== schedule.id && JSON.stringify(one).includes(`"${profileId}"`),
  );
  const isShared =
    sharers.length > 0 || days.some(([kind]) => kind !== day && schedule[kind] === profileId);
  return (
    <>
      <div className="sheet-head">
        <h1 className="unseen">{nameOf(schedule)}</h1>
        <TextCell
          label="Name of the schedule"
          className="is-title"
          value={nameOf(schedule)}
          onCommit={(name) =>
            app.edit(scheduleFieldEdit(form, building, schedule, 'name', name, `Named ${name}`))
          }
        />
        <span className="quiet">{usersOf(building, schedule.id)}</span>
        <span className="sheet-acts">
          <button type="button" className="button" onClick={() => app.choose('use', 'gains')}>
            All gains
          </button>
          <button
            type="button"
            className="button"
            onClick={() => {
              const { id, edit } = newSchedule(building, schedule);
              app.edit(edit);
              app.choose('use', id);
            }}
          >
            Copy schedule
          </button>
        </span>
      </div>
      <div className="tabs" role="tablist" aria-label="Kind of day">
        {days.map(([kind, name]) => (
          <button
            key={kind}
            type="button"
            role="tab"
            id={`day-${kind}`}
            aria-controls="day-panel"
            aria-selected={kind === day}
            onClick={() => setDay(kind)}
          >
            {name}
          </button>
        ))}
      </div>
      <div role="tabpanel" id="day-panel" aria-labelledby={`day-${day}`}>
        <div className="climate-row">
          <span className="note">Hours of</span>
          <Choice<string>
            label={`Profile on ${day === 'profile' ? 'weekdays' : day}`}
            value={schedule[day] ?? ''}
            options={[
              ...(day === 'profile' ? [] : [{ value: '', name: 'the same as weekdays' }]),
              ...building.profiles.map((one) => ({ value: one.id, name: nameOf(one) })),
            ]}
            onChoose={(id) =>
              app.edit(dayEdit(form, building, schedule, day, id === '' ? undefined : id))
            }
          />
          {isShared && (
            <>
              <span className="note">
                shared
                {sharers.length > 0
                  ? ` with ${sharers.map(nameOf).join(', ')}`
                  : ' with other days'}
                : a change here moves them all.
              </span>
              <button
                type="button"
                className="text-button"
                onClick={() => {
                  const own = ownDayProfile(form, building, schedule, day);
                  if (own) app.edit(own);
                }}
              >
                Give it hours of its own
              </button>
            </>
          )}
        </div>
        {profile?.kind === 'hours' && (
          <DayPainter
            key={profile.id}
            name={nameOf(profile)}
            values={profile.values}
            onPaint={(values, gesture) =>
              app.edit(profileEdit(form, building, profile, values, gesture))
            }
            onEnd={() => app.endGesture()}
          />
        )}
        {profile?.kind === 'points' && (
          <p className="quiet">
            This profile is given by points joined by lines.{' '}
            <button
              type="button"
              className="link"
              onClick={() =>
                app.edit(profileEdit(form, building, profile, meansOf(profile.points)))
              }
            >
              Turn it into hours
            </button>
          </p>
        )}
      </div>
      <Periods form={form} building={building} schedule={schedule} />
    </>
  );
}

/** The value in the middle of each hour. */
function meansOf(points: readonly { readonly atH: number; readonly value: number }[]): number[] {
  return Array.from({ length: 24 }, (_, hour) => {
    const at = hour + 0.5;
    const next = points.findIndex(({ atH }) => atH > at);
    const after = points[next];
    const before = next < 0 ? points.at(-1) : points[next - 1];
    if (!after || !before) return (after ?? before)?.value ?? 0;
    const share = (at - before.atH) / (after.atH - before.atH);
    return Number((before.value + share * (after.value - before.value)).toFixed(4));
  });
}

function usersOf(building: Building, id: string): string {
  const rooms = building.rooms.filter((room) => JSON.stringify(room).includes(`"${id}"`));
  if (rooms.length === 0) return 'used by no room';
  return `used in ${rooms.map(({ name }) => name).join(', ')}`;
}
