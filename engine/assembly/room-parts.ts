// What the parts of the assembly hand to each other about one room.
import type { Boundary, Rectangle, Room } from '../building/index.ts';
import type { LayerMiddle } from './fabric.ts';
import type { DrawnHours, PeopleHours } from './gains.ts';
import type { PlantParts } from './plant.ts';
import type { WindowHours } from './window-hours.ts';

/** To which line of the room's heat balance the heat through a face belongs. */
export type FaceBalance = 'opaque' | 'glazing' | 'ground' | 'rooms';

/** One face that looks into the room: the inside of a surface, or of a window. */
export interface Face {
  readonly node: number;
  /** Node at the face's radiosity, where its emissivity changes; the enclosure sees it as black. */
  readonly radiantNode?: number;
  /** The middle of each layer, where the face is one of a construction. */
  readonly layers?: readonly LayerMiddle[];
  readonly surface: string;
  /** Id of the opening where the face is glass. */
  readonly opening?: string;
  readonly name: string;
  readonly areaM2: number;
  /** Tilt and azimuth of the surface's outward normal. */
  readonly tiltDeg: number;
  readonly azimuthDeg: number;
  readonly emissivity: number;
  readonly balance: FaceBalance;
  readonly boundary: Boundary['kind'];
  /** Place on the box's face, where given. */
  readonly rectangle?: Rectangle;
  /** How it answers light from inside. */
  readonly light: FaceLight;
}

/** Shares of the light that meets a face from inside, 0 to 1; the rest is thrown back. */
export interface FaceLight {
  readonly absorbed: number;
  /** Lost to the outside (glass only). */
  readonly transmitted: number;
}

/** The meters of one room, by their place in the problem's list. */
export interface RoomMeters {
  readonly solar: number;
  readonly gains: number;
  readonly heating: number;
  readonly cooling: number;
  readonly opaque: number;
  readonly glazing: number;
  readonly ground: number;
  readonly infiltration: number;
  readonly ventilation: number;
  readonly rooms: number;
  readonly storage: number;
}

/** The comfort band hour by hour. */
export interface ComfortHours {
  readonly bandLowC: Float64Array;
  readonly bandHighC: Float64Array;
  readonly occupied: Uint8Array;
  /** What people wear (null: by the weather) and do, where votes are asked for. */
  readonly votes: {
    readonly clothingClo: Float64Array | null;
    readonly metRate: Float64Array;
  } | null;
}

/** A room as node and meter numbers: findings map results back through it. */
export interface RoomParts {
  readonly room: Room;
  readonly airNode: number;
  readonly massNodes: readonly number[];
  readonly faces: readonly Face[];
  readonly meters: RoomMeters;
  readonly comfort: ComfortHours | null;
  /** Heaters and chillers, the main heater before its backup. */
  readonly plants: readonly PlantParts[];
  readonly people: readonly PeopleHours[];
  /** Power that gains draw from carriers. */
  readonly drawn: readonly DrawnHours[];
  readonly windows: readonly WindowHours[];
}
