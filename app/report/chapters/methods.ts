// By which published methods the figures were computed, as the project chose them.

import type { Building } from '../../../engine/index.ts';
import { type Markup, markup } from '../markup.ts';
import type { ChapterMaker } from '../report.ts';

type Physics = Building['physics'];
type Choices = { readonly [K in keyof Physics]: Readonly<Record<Physics[K], string>> };

/** Each choice of the project's "physics", with where it is published. */
const choices: Choices = {
  conduction: {
    fine: 'layers cut into cells by their Fourier number, heat capacity on the cells’ edges',
    coarse: 'layers cut into few cells by their Fourier number',
  },
  insideConvection: {
    walton:
      'natural convection by temperature difference and tilt: ASHRAE Handbook of Fundamentals; Walton, NBSIR 83-2655 (1983)',
    'alamdari-hammond': 'Alamdari and Hammond (1983)',
    'iso-6946': 'constant films of ISO 6946:2017, Annex C',
  },
  outsideConvection: {
    'yazdanian-klems':
      'wind at the height of the face: Yazdanian and Klems (1994), roughness after Walton (1983)',
    'iso-6946': 'by wind speed, ISO 6946:2017, Annex C',
    mcadams: 'rough plate, McAdams (1954)',
    constant: '20 W/(m²·K) throughout, as ISO 6946 has it at 4 m/s',
  },
  insideLongWave: {
    'grey-enclosure':
      'grey enclosure after Gebhart; view factors of a box after Ehlert and Smith (1993), elsewhere by area weighting',
    'mean-radiant-node': 'one mean radiant node, Carroll (1980)',
  },
  outsideLongWave: {
    'low-sky-at-air': 'sky, ground, and the low sky at air temperature',
    'unmixed-sky': 'sky and ground',
  },
  skyTemperature: {
    auto: 'horizontal infrared where the table has it, else Berdahl and Martin (1984), Martin and Berdahl (1984)',
    'berdahl-martin': 'Berdahl and Martin (1984), Martin and Berdahl (1984)',
    'clark-allen': 'Clark and Allen (1978)',
    brunt: 'Brunt (1932)',
    'air-11': '11 K below the air, ISO 52016-1',
  },
  diffuseSky: {
    perez: 'Perez et al. (1990)',
    'hay-davies': 'Hay and Davies (1980)',
    isotropic: 'an evenly bright sky',
  },
  diffuseSplit: {
    erbs: 'Erbs, Klein and Duffie (1982)',
    'orgill-hollands': 'Orgill and Hollands (1977)',
    reindl: 'Reindl, Beckman and Duffie (1990)',
    boland: 'Boland, Scott and Luther (2001)',
    'boland-ridley-lauret': 'Ridley, Boland and Lauret (2010)',
  },
  beamInside: {
    floor: 'on the floor',
    patch: 'on the faces that its patch meets, by geometry',
  },
  diffuseInside: {
    'view-factors': 'on what the window sees, by view factors',
    'sky-and-ground': 'sky light downward, ground light upward',
  },
  solarInside: {
    radiosity: 'followed until absorbed, or out through the glass again (radiosity)',
    'fixed-shares': 'in fixed shares; no reflection is followed',
  },
};

export const methods: ChapterMaker = ({ building: { physics } }) => {
  const rows: readonly (readonly [what: string, how: string])[] = [
    ['Time', 'network of nodes in implicit steps of second order: SDIRK2, Alexander (1977)'],
    ['Conduction', choices.conduction[physics.conduction]],
    ['Convection inside', choices.insideConvection[physics.insideConvection]],
    ['Convection outside', choices.outsideConvection[physics.outsideConvection]],
    ['Heat radiation inside', choices.insideLongWave[physics.insideLongWave]],
    ['Heat radiation outside', choices.outsideLongWave[physics.outsideLongWave]],
    ['Place of the sun', 'Reda and Andreas, NREL/TP-560-34302 (2008)'],
    ['Split of a lone global radiation', choices.diffuseSplit[physics.diffuseSplit]],
    ['Sun on a plane', choices.diffuseSky[physics.diffuseSky]],
    [
      'Sun through glass',
      'by angle, Fresnel; absorption pane by pane, Edwards (1977); gas gaps, ISO 15099 and EN 673',
    ],
    ['Beam inside', choices.beamInside[physics.beamInside]],
    ['Diffuse light inside', choices.diffuseInside[physics.diffuseInside]],
    ['Reflected light inside', choices.solarInside[physics.solarInside]],
    ['Sky temperature', choices.skyTemperature[physics.skyTemperature]],
    ['Moist air', 'ASHRAE Handbook of Fundamentals, after Hyland and Wexler (1983)'],
    [
      'Comfort',
      'operative temperature, ISO 7726 and ISO 7730; hours and degree hours outside a band, EN 16798-2',
    ],
  ];
  const lines = rows.map(
    ([what, how]): Markup => markup`<div><dt>${what}</dt><dd>${how}</dd></div>\n`,
  );
  return {
    id: 'methods',
    title: 'Methods',
    html: markup`<dl class="lines">\n${lines}</dl>\n`,
  };
};
