export {
  axisDay,
  type Calendar,
  clock,
  clockText,
  dayText,
  hourSpan,
  hourText,
  type Month,
  makeCalendar,
  stampText,
} from './calendar.ts';
export {
  difference,
  duration,
  figure,
  plain,
  powerOfTen,
  type Quantity,
  quantity,
} from './number.ts';
