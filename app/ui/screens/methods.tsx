// Which published method computes what, and the land around the house. Every choice is a run of its own
// against the base, so what it does to the answers is seen at once.

import { FormCell, FormChoice } from '../parts/form-cell.tsx';
import { useEditedProject } from '../state/index.ts';

const methods = [
  [
    'conduction',
    'Heat through walls',
    'How finely walls are cut',
    [
      ['fine', 'Finite volumes, fine'],
      ['coarse', 'Finite volumes, coarse'],
    ],
  ],
  [
    'insideConvection',
    'Films inside',
    'Air along the inner faces',
    [
      ['walton', 'Walton 1983, by tilt and temperature'],
      ['alamdari-hammond', 'Alamdari & Hammond 1983'],
      ['iso-6946', 'ISO 6946, constant'],
    ],
  ],
  [
    'outsideConvection',
    'Films outside',
    'Wind along the outer faces',
    [
      ['yazdanian-klems', 'Yazdanian & Klems 1994'],
      ['iso-6946', 'ISO 6946, 4 + 4 v'],
      ['mcadams', 'McAdams 1954'],
      ['constant', 'Constant'],
    ],
  ],
  [
    'insideLongWave',
    'Heat radiation inside',
    'Between the faces of a room',
    [
      ['grey-enclosure', 'Grey enclosure, view factors'],
      ['mean-radiant-node', 'Mean radiant node'],
    ],
  ],
  [
    'outsideLongWave',
    'Heat radiation outside',
    'What faces see of the sky',
    [
      ['low-sky-at-air', 'Low sky at air temperature'],
      ['unmixed-sky', 'Sky and ground unmixed'],
    ],
  ],
  [
    'skyTemperature',
    'Sky temperature',
    'How cold the sky is',
    [
      ['auto', 'From the table, else Berdahl & Martin'],
      ['berdahl-martin', 'Berdahl & Martin 1984'],
      ['clark-allen', 'Clark & Allen 1978'],
      ['brunt', 'Brunt 1932'],
      ['air-11', 'Air temperature less 11 K'],
    ],
  ],
  [
    'diffuseSky',
    'Diffuse sun',
    'Light of the sky on tilted planes',
    [
      ['perez', 'Perez 1990'],
      ['hay-davies', 'Hay & Davies 1980'],
      ['isotropic', 'Isotropic'],
    ],
  ],
  [
    'beamInside',
    'Sun patch',
    'Where the beam falls in a room',
    [
      ['floor', 'All on the floor'],
      ['patch', 'Patch, hour by hour'],
    ],
  ],
  [
    'diffuseInside',
    'Diffuse light inside',
    'Where it meets the faces first',
    [
      ['view-factors', 'As the window sees them'],
      ['sky-and-ground', 'Sky light down, ground light up'],
    ],
  ],
  [
    'solarInside',
    'Light thrown back inside',
    'Reflections between the faces',
    [
      ['radiosity', 'Followed (radiosity)'],
      ['fixed-shares', 'Fixed shares, none lost'],
    ],
  ],
] as const;

const terrains = [
  { value: 'water', name: 'Open water' },
  { value: 'open', name: 'Open country' },
  { value: 'suburban', name: 'Suburb, woodland' },
  { value: 'city', name: 'City centre' },
] as const;

export function Methods() {
  const project = useEditedProject();
  if (!project) return null;
  const { building } = project;
  return (
    <>
      <div className="sheet-head">
        <h1>Methods</h1>
        <span className="quiet">
          published methods by author and year; the first is the usual one
        </span>
      </div>
      <div className="fields is-wide">
        {methods.map(([field, name, note, options]) => (
          <div key={field} className="field-row">
            <span>
              {name} <span className="note">{note}</span>
            </span>
            <FormChoice<string>
              label={name}
              path={`physics.${field}`}
              value={building.physics[field]}
              options={options.map(([value, word]) => ({ value, name: word }))}
            />
          </div>
        ))}
      </div>
      <h2 className="table-head">Land around the house</h2>
      <div className="fields is-wide">
        <div className="field-row">
          <span>
            Terrain <span className="note">for the wind at the height of a face</span>
          </span>
          <FormChoice<string>
            label="Terrain"
            path="site.terrain"
            value={building.site.terrain}
            options={terrains}
          />
        </div>
        <div className="field-row">
          <span>
            Ground reflectance <span className="note">grass 0.2, pale paving 0.35, snow 0.7</span>
          </span>
          <FormCell
            label="Ground reflectance"
            quantity="share"
            path="site.groundReflectance"
            value={building.site.groundReflectance}
            min={0}
            max={1}
            step={0.05}
          />
        </div>
      </div>
    </>
  );
}
