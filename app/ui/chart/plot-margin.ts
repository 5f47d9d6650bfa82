// Left and right margins that all charts of a sheet share, so that they start and end on the same
// pixel. A sheet whose lines have no names at their ends needs no right margin.

import { createContext, useContext } from 'react';

export interface PlotMargin {
  readonly left: number;
  readonly right: number;
}

export const namedLines: PlotMargin = { left: 64, right: 44 };
export const noNames: PlotMargin = { left: 64, right: 1 };

export const PlotMarginContext = createContext<PlotMargin>(namedLines);

export function usePlotMargin(): PlotMargin {
  return useContext(PlotMarginContext);
}
