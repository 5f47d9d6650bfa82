export { type Against, type Pair, setAgainst } from './against.ts';
export { type Answer, findAnswers } from './answers.ts';
export { type Caution, findCautions } from './cautions.ts';
export { type FigureKind, figureKinds, type Ranked, rankRooms } from './ranking.ts';
