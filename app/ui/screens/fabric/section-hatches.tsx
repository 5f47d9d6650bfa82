// How materials are drawn in section, told apart by what they are like: heavy, light, insulating.

import type { Building } from '../../../../engine/index.ts';
import type { LayerForm } from '../../../project/index.ts';

export function layerHatch(layer: LayerForm | undefined, building: Building): string {
  if (!layer || !('material' in layer)) return 'url(#hatch-air)';
  const material = building.materials.find(({ id }) => id === layer.material);
  if (!material) return 'none';
  if (material.conductivityWPerMK <= 0.065) return 'url(#hatch-wool)';
  if (material.densityKgPerM3 < 700) return 'url(#hatch-wood)';
  if (layer.thicknessM >= 0.06) return 'url(#hatch-brick)';
  return 'url(#hatch-dots)';
}

export function SectionHatches() {
  return (
    <defs>
      <pattern id="hatch-brick" width="44" height="24" patternUnits="userSpaceOnUse">
        <path className="hatch" d="M0 0.5H44M0 12.5H44M11 0.5V12.5M33 12.5V24" />
      </pattern>
      <pattern id="hatch-wool" width="16" height="8" patternUnits="userSpaceOnUse">
        <path className="hatch" d="M0 4C3 0 5 0 8 4S13 8 16 4" />
      </pattern>
      <pattern id="hatch-wood" width="14" height="14" patternUnits="userSpaceOnUse">
        <path className="hatch" d="M0 14L14 0" />
      </pattern>
      <pattern id="hatch-dots" width="7" height="7" patternUnits="userSpaceOnUse">
        <circle className="hatch-dot" cx="2" cy="2" r="0.8" />
      </pattern>
      <pattern id="hatch-air" width="6" height="6" patternUnits="userSpaceOnUse">
        <path className="hatch" d="M3 0V3" />
      </pattern>
      <pattern id="hatch-wet" width="6" height="6" patternUnits="userSpaceOnUse">
        <path className="hatch-wet" d="M0 6L6 0" />
      </pattern>
    </defs>
  );
}
