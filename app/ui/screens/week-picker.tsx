import { type Calendar, dayText } from '../format/index.ts';
import type { Week } from '../series/year.ts';

export interface WeekPickerProps {
  readonly weeks: readonly Week[];
  readonly chosen: number;
  readonly worst: number;
  readonly calendar: Calendar;
  readonly onChoose: (index: number) => void;
}

/** The week before, any week by name, the week after, and back to the worst. */
export function WeekPicker({ weeks, chosen, worst, calendar, onChoose }: WeekPickerProps) {
  const name = (week: Week) => `${dayText(calendar, week.firstHour)}`;
  return (
    <div className="week-picker">
      <button
        type="button"
        className="button is-square"
        aria-label="Week before"
        disabled={chosen <= 0}
        onClick={() => onChoose(chosen - 1)}
      >
        <Wedge d="M8 2L3 6.5L8 11" />
      </button>
      <span className="select">
        <select
          aria-label="Week"
          value={chosen}
          onChange={(event) => onChoose(Number(event.target.value))}
        >
          {weeks.map((week, i) => (
            <option key={week.firstHour} value={i}>
              {`Week of ${name(week)}${i === worst ? ', worst' : ''}`}
            </option>
          ))}
        </select>
        <svg width="9" height="6" aria-hidden="true">
          <path d="M0 0.5H9L4.5 5.5Z" fill="currentColor" />
        </svg>
      </span>
      <button
        type="button"
        className="button is-square"
        aria-label="Week after"
        disabled={chosen >= weeks.length - 1}
        onClick={() => onChoose(chosen + 1)}
      >
        <Wedge d="M4 2L9 6.5L4 11" />
      </button>
      <button
        type="button"
        className="button"
        disabled={chosen === worst}
        onClick={() => onChoose(worst)}
      >
        Worst week
      </button>
    </div>
  );
}

function Wedge({ d }: { d: string }) {
  return (
    <svg width="12" height="13" aria-hidden="true">
      <path d={d} fill="none" stroke="currentColor" strokeWidth="1.5" />
    </svg>
  );
}
