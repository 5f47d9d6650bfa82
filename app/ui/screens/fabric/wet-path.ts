import type { ConstructionSection } from '../../../../engine/index.ts';
import type { LayerPlace } from './section-scale.ts';

/** Where the dew point lies above the temperature. */
export function wetPath(
  { layers }: ConstructionSection,
  places: readonly LayerPlace[],
  y: (celsius: number) => number,
): string {
  return layers
    .flatMap(({ outerC, innerC, dewPointC }, i) => {
      const at = places[i];
      if (!at || !dewPointC) return [];
      const last = dewPointC.length - 1;
      const point = (p: number) => {
        const share = p / last;
        return {
          x: at.x + at.width * share,
          t: outerC + share * (innerC - outerC),
          dew: dewPointC[p] ?? 0,
        };
      };
      return dewPointC.slice(1).map((_, p) => {
        const [a, b] = [point(p), point(p + 1)];
        if (a.dew <= a.t && b.dew <= b.t) return '';
        const up = (one: typeof a) => y(Math.max(one.dew, one.t)).toFixed(1);
        return `M${a.x} ${y(a.t).toFixed(1)}L${a.x} ${up(a)}L${b.x} ${up(b)}L${b.x} ${y(b.t).toFixed(1)}Z`;
      });
    })
    .join('');
}
