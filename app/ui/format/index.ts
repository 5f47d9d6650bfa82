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
  type QuantityName,
  shownQuantities,
  shownUnit,
  shownValue,
  type UnitSystem,
} from './display-units.ts';
export {
  difference,
  duration,
  figure,
  plain,
  powerOfTen,
  type Quantity,
  quantity,
} from './number.ts';
export { type Dimension, type Typed, typedQuantity } from './typed-quantity.ts';
