export {
  axisDay,
  type Calendar,
  clock,
  dayText,
  hourSpan,
  type Month,
  makeCalendar,
  monthOf,
  whenText,
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
