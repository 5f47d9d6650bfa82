// Times of the year in which another profile holds: summer, weeks away.

import type { Building } from '../../../../engine/index.ts';
import {
  nameOf,
  type ProjectForm,
  type ScheduleForm,
  scheduleFieldEdit,
} from '../../../project/index.ts';
import { Choice } from '../../parts/choice.tsx';
import { DayCell } from '../../parts/day-cell.tsx';
import { useApp } from '../../state/index.ts';

export interface PeriodsProps {
  readonly form: ProjectForm;
  readonly building: Building;
  readonly schedule: Building['schedules'][number] & ScheduleForm;
}

export function Periods({ form, building, schedule }: PeriodsProps) {
  const app = useApp();
  const { periods } = schedule;
  const set = (next: typeof periods, words: string) =>
    app.edit(
      scheduleFieldEdit(form, building, schedule, 'periods', next, `${nameOf(schedule)}, ${words}`),
    );
  const change = (i: number, part: Partial<(typeof periods)[number]>) =>
    set(
      periods.map((one, p) => (p === i ? { ...one, ...part } : one)),
      'period',
    );
  return (
    <>
      <h2 className="table-head">Other times of the year</h2>
      <p className="quiet">
        From and to are included, and a period may cross new year. It comes before the week above.
      </p>
      {periods.length > 0 && (
        <table className="layers grid-table" aria-label="Other times of the year">
          <thead>
            <tr>
              <th scope="col">From</th>
              <th scope="col" className="word">
                To
              </th>
              <th scope="col" className="word">
                Profile
              </th>
              <th scope="col">
                <span className="unseen">Acts</span>
              </th>
            </tr>
          </thead>
          <tbody>
            {periods.map((period, i) => (
              // biome-ignore lint/suspicious/noArrayIndexKey: periods have no ids
              <tr key={i}>
                <td>
                  <DayCell
                    label={`Period ${i + 1}, from`}
                    value={period.from}
                    onCommit={(from) => change(i, { from })}
                  />
                </td>
                <td>
                  <DayCell
                    label={`Period ${i + 1}, to`}
                    value={period.to}
                    onCommit={(to) => change(i, { to })}
                  />
                </td>
                <td>
                  <Choice<string>
                    label={`Period ${i + 1}, profile`}
                    value={period.profile}
                    options={building.profiles.map((one) => ({ value: one.id, name: nameOf(one) }))}
                    onChoose={(profile) => change(i, { profile })}
                  />
                </td>
                <td className="row-acts">
                  <button
                    type="button"
                    className="text-button"
                    onClick={() =>
                      set(
                        periods.filter((_, p) => p !== i),
                        'period removed',
                      )
                    }
                  >
                    Remove<span className="unseen"> period {i + 1}</span>
                  </button>
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
      <button
        type="button"
        className="button after-table"
        onClick={() =>
          set(
            [...periods, { from: '07-01', to: '07-14', profile: schedule.profile }],
            'period added',
          )
        }
      >
        Add period
      </button>
    </>
  );
}
