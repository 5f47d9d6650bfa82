// The time cursor around a drawing: the pointer marks an hour, a click pins it, arrows move an hour,
// with Shift a day, Page keys a week; Escape lets go. To assistive technology it is a slider.

import type { KeyboardEvent, ReactNode } from 'react';

export interface HourSliderProps {
  readonly label: string;
  readonly min: number;
  readonly max: number;
  readonly hour: number;
  readonly text: string;
  readonly onMove: (hour: number) => void;
  readonly onLetGo: () => void;
  readonly children: ReactNode;
}

const stepsH: Readonly<Record<string, number>> = {
  ArrowLeft: -1,
  ArrowRight: 1,
  ArrowDown: -1,
  ArrowUp: 1,
  PageUp: -168,
  PageDown: 168,
};

/** Hours that a key moves by; with Shift an arrow moves a day. */
export function hoursOfKey(key: string, isShift: boolean): number {
  const step = stepsH[key] ?? 0;
  return isShift && Math.abs(step) === 1 ? step * 24 : step;
}

export function HourSlider(props: HourSliderProps) {
  const { label, min, max, hour, text, onMove, onLetGo, children } = props;

  function press(event: KeyboardEvent) {
    if (event.key === 'Escape') return onLetGo();
    const byHours = hoursOfKey(event.key, event.shiftKey);
    const next = event.key === 'Home' ? min : event.key === 'End' ? max : hour + byHours;
    if (next === hour && byHours === 0) return;
    event.preventDefault();
    onMove(Math.min(max, Math.max(min, next)));
  }

  return (
    <div
      className="hour-slider"
      role="slider"
      tabIndex={0}
      aria-label={label}
      aria-valuemin={min}
      aria-valuemax={max}
      aria-valuenow={hour}
      aria-valuetext={text}
      onKeyDown={press}
    >
      {children}
    </div>
  );
}
