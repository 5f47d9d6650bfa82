// The front door of the physics: all that other folders may import.

export * from './conduction-mesh.ts';
export * from './inside-film.ts';
export * from './outside-film.ts';
export * from './wall-dynamics.ts';
export * from './wind-at-height.ts';
