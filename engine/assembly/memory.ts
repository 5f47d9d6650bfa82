// What costs time and depends on little, kept from one assembly to the next: an edit of a set-point does
// not compute the sun again. Keys name all that a value depends on; what several assemblies in a row did
// not ask for is forgotten. Arrays in here are shared and never written to.
import type { PlaneIrradiance, WeatherSteps, WeatherYear } from '../../weather/index.ts';
import type { FaceSun } from './shading.ts';
import type { RoomLight } from './sun-inside.ts';

const keptFor = 8; // assemblies, enough to go to and fro between a few options

/** Values of one kind by key. */
export class Kept<T> {
  private readonly held = new Map<string, { value: T; lastAsked: number }>();
  private turn = 0;

  /** The value under a key, made where it is not there. */
  of(key: string, make: () => T): T {
    const found = this.held.get(key);
    if (found) {
      found.lastAsked = this.turn;
      return found.value;
    }
    const value = make();
    this.held.set(key, { value, lastAsked: this.turn });
    return value;
  }

  /** Begins the next assembly. */
  next(): void {
    this.turn++;
    for (const [key, { lastAsked }] of this.held)
      if (this.turn - lastAsked > keptFor) this.held.delete(key);
  }
}

/** All that is kept, for one weather year. A worker holds one of these as long as it lives. */
export interface Memory {
  /** The solver's kernel as bytes, where the host could load it. */
  readonly kernel: Uint8Array | null;
  weather: WeatherYear | null;
  steps: Kept<WeatherSteps>;
  planes: Kept<PlaneIrradiance>;
  faceSuns: Kept<FaceSun>;
  films: Kept<Float64Array>;
  roomLight: Kept<RoomLight>;
}

/** @param kernel of the solver, for the runs of whoever holds the memory */
export function emptyMemory(kernel: Uint8Array | null = null): Memory {
  return {
    kernel,
    weather: null,
    steps: new Kept(),
    planes: new Kept(),
    faceSuns: new Kept(),
    films: new Kept(),
    roomLight: new Kept(),
  };
}

/** Makes a memory ready for an assembly: what belongs to another weather year is gone. */
export function turnMemory(memory: Memory, weather: WeatherYear): void {
  if (memory.weather !== weather) Object.assign(memory, emptyMemory(memory.kernel), { weather });
  for (const kept of [memory.steps, memory.planes, memory.faceSuns, memory.films, memory.roomLight])
    kept.next();
}
