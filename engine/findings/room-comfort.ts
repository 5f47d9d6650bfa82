// A room against the published methods of comfort, as far as its project asks for them.
import type { RoomParts } from '../assembly/index.ts';
import type { Run } from '../network/index.ts';
import { type AdaptiveFindings, adaptiveFindings } from './comfort-adaptive.ts';
import { type LocalFindings, localFindings } from './comfort-local.ts';
import { hourlyVotes, type VoteFindings, voteFindings } from './comfort-votes.ts';
import { type OverheatingFindings, overheatingFindings } from './overheating.ts';
import type { RoomHours } from './simulation.ts';

/** Extra findings of a room; each is there where its method was asked for and somebody is there. */
export interface RoomComfort {
  readonly adaptive?: readonly AdaptiveFindings[];
  readonly overheating?: readonly OverheatingFindings[];
  readonly votes?: VoteFindings;
  readonly local?: LocalFindings;
}

/** What all rooms share. */
export interface ComfortClimate {
  readonly outdoorC: Float64Array;
  readonly runningMeanC: Float64Array;
  readonly latitudeDeg: number;
  readonly year: number;
}

/** Findings, and the vote of each hour where votes were asked for. */
export function roomComfort(
  run: Run,
  parts: RoomParts,
  hours: RoomHours,
  climate: ComfortClimate,
): { readonly findings: RoomComfort; readonly vote: Float64Array | null } {
  const { room } = parts;
  const { comfort } = room;
  if (!comfort || !parts.comfort || !hours.occupied.includes(1))
    return { findings: {}, vote: null };
  const { operativeC, occupied, airC, meanRadiantC } = hours;
  const { outdoorC, runningMeanC, latitudeDeg, year } = climate;
  const { category, bedroom } = comfort;
  const worn = parts.comfort.votes;
  const humidity = hours.relativeHumidity ? { relativeHumidity: hours.relativeHumidity } : {};
  const vote =
    comfort.votes && worn
      ? hourlyVotes({
          airC,
          meanRadiantC,
          occupied,
          outdoorC,
          ...comfort.votes,
          ...worn,
          ...humidity,
        })
      : null;
  const votes = vote && voteFindings(vote, category);
  const local =
    comfort.local &&
    localFindings(room, comfort.local, {
      airC,
      occupied,
      faces: parts.faces,
      faceC: parts.faces.map((face) => recordedC(run, face.node)),
    });
  return {
    findings: {
      adaptive: adaptiveFindings(operativeC, occupied, runningMeanC, !room.cooling),
      overheating: overheatingFindings({
        operativeC,
        occupied,
        runningMeanC,
        category,
        bedroom,
        latitudeDeg,
        year,
      }),
      ...(votes ? { votes } : {}),
      ...(local ? { local } : {}),
    },
    vote,
  };
}

/** Hourly means of a recorded node. */
function recordedC(run: Run, node: number): Float64Array {
  const { recordNodes } = run.problem;
  const at = recordNodes.indexOf(node);
  return Float64Array.from(
    { length: run.records },
    (_, h) => run.meanC[h * recordNodes.length + at],
  );
}
