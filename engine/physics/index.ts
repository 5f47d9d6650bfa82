// The front door of the physics: all that other folders may import.

export * from './approximate-view-factors.ts';
export * from './close-exchange.ts';
export * from './conduction-mesh.ts';
export * from './dense.ts';
export * from './inside-film.ts';
export * from './outside-film.ts';
export * from './radiosity.ts';
export * from './view-factors.ts';
export * from './wall-dynamics.ts';
export * from './wind-at-height.ts';
