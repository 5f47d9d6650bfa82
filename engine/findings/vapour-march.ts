// The vapour balance over the year, after the thermal run: air flows at the run's hourly temperatures,
// humidity step by step. Coupling goes one way: the run's heat does not feel the vapour; what
// (de)humidifiers, people and condensation turn over as latent heat is reported beside it.
//
// Steps of at most 15 min.
import { humidityRatio, saturationPressurePa } from '../../weather/index.ts';
import type { Assembly, RoomVapour } from '../assembly/index.ts';
import { personGain } from '../physics/index.ts';
import type { VapourRooms, VapourStage } from './vapour-stage.ts';
import { advanceVapour, firstShare, vapourState } from './vapour-step.ts';

/** Hours of one room. */
export interface VapourHours {
  /** Water per kg of dry air, mean of the hour. */
  readonly humidityRatio: Float64Array;
  /** Share, 0 to 1, at the hour's mean air temperature. */
  readonly relativeHumidity: Float64Array;
  readonly vapourPa: Float64Array;
  /** Means of the hour [kg/s]; each 0 or more, but `airKgPerS`: what all air brings, less what it takes. */
  readonly gainKgPerS: Float64Array;
  readonly airKgPerS: Float64Array;
  readonly humidifyKgPerS: Float64Array;
  readonly dryKgPerS: Float64Array;
  readonly condenseKgPerS: Float64Array;
  /** Into the buffer; negative gives back. */
  readonly bufferKgPerS: Float64Array;
  /** What the air of the room holds at the end less at the start [kg]. */
  readonly storedKg: number;
}

const longestStepS = 900;
const massRatio = 0.621945;
const spinUpHours = 168;
const mostSpinUps = 30;
const settledShare = 1e-4;

/** The march reads `airC[r][h]`, mean air temperature of room r in hour h. */
export function marchVapour(
  assembly: Assembly,
  vapours: readonly RoomVapour[],
  airC: readonly Float64Array[],
): VapourHours[] {
  const { airSite: site, airFlows, rooms: parts } = assembly;
  const count = vapours.length;
  const hours = airC[0].length;
  const stepS = site.clock.stepS;
  const stepsPerHour = 3600 / stepS;
  const cuts = Math.max(1, Math.ceil(stepS / longestStepS));
  const spanS = stepS / cuts;
  const values = () => new Float64Array(count);
  const between = airFlows.filter((flow) => flow.from >= 0);
  const outdoor = airFlows.filter((flow) => flow.from < 0);
  const streams = between.flatMap((flow) =>
    flow.mutual
      ? [
          { flow, from: flow.from, to: flow.to },
          { flow, from: flow.to, to: flow.from },
        ]
      : [{ flow, from: flow.from, to: flow.to }],
  );
  const rooms = {
    count,
    airKg: Float64Array.from(vapours, (v) => v.airKg),
    bufferKg: Float64Array.from(vapours, (v) => v.bufferKg),
    bufferKgPerSPa: Float64Array.from(vapours, (v) => v.bufferKgPerSPa),
    gainKgPerS: values(),
    saturationPa: values(),
    wetEnoughRatio: values(),
    dryEnoughRatio: values(),
    saturatedRatio: values(),
    maxHumidifyKgPerS: Float64Array.from(vapours, (v) => v.humidifier?.maxKgPerS ?? 0),
    maxDryKgPerS: Float64Array.from(vapours, (v) => v.dehumidifier?.maxKgPerS ?? 0),
    freshKgPerS: values(),
    outdoorRatio: 0,
    streamFrom: Int32Array.from(streams, (s) => s.from),
    streamTo: Int32Array.from(streams, (s) => s.to),
    streamKgPerS: new Float64Array(streams.length),
    pressurePa: site.properties.pressurePa,
  } satisfies VapourRooms;

  const state = vapourState(count);
  const { ratio, buffer, one, two } = state;
  ratio.fill(site.humidityRatio[0]);
  const bufferBefore = values();
  const personVapour = values();
  const hourly = vapours.map(() => emptyHours(hours));

  function loadHour(h: number): void {
    for (let r = 0; r < count; r++) {
      const temperatureC = airC[r][h];
      const saturation = saturationPressurePa(temperatureC);
      rooms.saturationPa[r] = saturation;
      rooms.saturatedRatio[r] = humidityRatio(saturation, rooms.pressurePa);
      const vapourPa = (rooms.pressurePa * ratio[r]) / (massRatio + ratio[r]);
      let people = 0;
      for (const { heads, metRate, sweats } of parts[r].people)
        if (heads[h] > 0)
          people +=
            heads[h] *
            personGain(metRate, sweats ? temperatureC : Math.min(24, temperatureC), vapourPa)
              .vapourKgPerS;
      personVapour[r] = people;
    }
  }

  function loadStep(k: number, h: number): void {
    rooms.freshKgPerS.fill(0);
    rooms.outdoorRatio = site.humidityRatio[k];
    for (const flow of outdoor)
      rooms.freshKgPerS[flow.to] +=
        (1 - flow.keptShare) * flow.massKgPerS(k, site.outdoorC[k], airC[flow.to][h]);
    streams.forEach(({ flow }, s) => {
      rooms.streamKgPerS[s] = flow.massKgPerS(k, airC[flow.from][h], airC[flow.to][h]);
    });
    for (let r = 0; r < count; r++) {
      const { sourceKgPerS, humidifier, dehumidifier } = vapours[r];
      rooms.gainKgPerS[r] = personVapour[r] + (sourceKgPerS === null ? 0 : sourceKgPerS[k]);
      const at = (share: number) => humidityRatio(share * rooms.saturationPa[r], rooms.pressurePa);
      rooms.wetEnoughRatio[r] = humidifier ? at(humidifier.humidity[k]) : -1;
      rooms.dryEnoughRatio[r] = dehumidifier
        ? at(dehumidifier.humidity[k])
        : Number.POSITIVE_INFINITY;
    }
  }

  function advance(h: number, record: boolean): void {
    bufferBefore.set(buffer);
    advanceVapour(rooms, state, spanS);
    if (!record) return;
    const share = spanS / 3600;
    addStage(hourly, rooms, one, h, firstShare * share);
    addStage(hourly, rooms, two, h, (1 - firstShare) * share);
    for (let r = 0; r < count; r++)
      hourly[r].bufferKgPerS[h] += (rooms.bufferKg[r] * (buffer[r] - bufferBefore[r])) / 3600;
  }

  function runHour(h: number, record: boolean): void {
    loadHour(h);
    for (let i = 0; i < stepsPerHour; i++) {
      loadStep(h * stepsPerHour + i, h);
      for (let c = 0; c < cuts; c++) advance(h, record);
    }
  }

  // Start-up: buffers begin at the room's own humidity, then the first week comes back to itself.
  loadHour(0);
  for (let r = 0; r < count; r++)
    buffer[r] = Math.min(
      1,
      (rooms.pressurePa * ratio[r]) / (massRatio + ratio[r]) / rooms.saturationPa[r],
    );
  for (let pass = 0; pass < mostSpinUps; pass++) {
    const before = [ratio.slice(), buffer.slice()];
    for (let h = 0; h < Math.min(spinUpHours, hours); h++) runHour(h, false);
    let drift = 0;
    for (let r = 0; r < count; r++)
      drift = Math.max(
        drift,
        Math.abs(ratio[r] - before[0][r]) / (ratio[r] + 1e-6),
        Math.abs(buffer[r] - before[1][r]),
      );
    if (drift < settledShare) break;
  }
  const begin = ratio.slice();
  for (let h = 0; h < hours; h++) runHour(h, true);
  return hourly.map((hoursOf, r) => {
    for (let h = 0; h < hours; h++) {
      const w = hoursOf.humidityRatio[h];
      hoursOf.vapourPa[h] = (rooms.pressurePa * w) / (massRatio + w);
      hoursOf.relativeHumidity[h] = hoursOf.vapourPa[h] / saturationPressurePa(airC[r][h]);
    }
    return { ...hoursOf, storedKg: vapours[r].airKg * (ratio[r] - begin[r]) };
  });
}

function emptyHours(hours: number) {
  const values = () => new Float64Array(hours);
  return {
    humidityRatio: values(),
    relativeHumidity: values(),
    vapourPa: values(),
    gainKgPerS: values(),
    airKgPerS: values(),
    humidifyKgPerS: values(),
    dryKgPerS: values(),
    condenseKgPerS: values(),
    bufferKgPerS: values(),
  };
}

/** Books one stage, by its share of the hour. */
function addStage(
  hourly: readonly ReturnType<typeof emptyHours>[],
  rooms: VapourRooms,
  stage: VapourStage,
  h: number,
  share: number,
): void {
  const { ratio } = stage;
  for (let r = 0; r < rooms.count; r++) {
    const of = hourly[r];
    of.humidityRatio[h] += share * ratio[r];
    of.gainKgPerS[h] += share * rooms.gainKgPerS[r];
    of.humidifyKgPerS[h] += share * stage.humidifyKgPerS[r];
    of.dryKgPerS[h] += share * stage.dryKgPerS[r];
    of.condenseKgPerS[h] += share * stage.condenseKgPerS[r];
    of.airKgPerS[h] += share * rooms.freshKgPerS[r] * (rooms.outdoorRatio - ratio[r]);
  }
  for (let s = 0; s < rooms.streamTo.length; s++) {
    const to = rooms.streamTo[s];
    const difference = ratio[rooms.streamFrom[s]] - ratio[to];
    hourly[to].airKgPerS[h] += share * rooms.streamKgPerS[s] * difference;
  }
}
