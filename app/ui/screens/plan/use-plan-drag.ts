// What the pointer does on the plan: moves a room, one of its sides, a window; draws a new room; places
// a window. A drag is one step of the history.

import { useRef, useState } from 'react';
import {
  addWindow,
  movedSide,
  moveWindow,
  type PlanRoom,
  placeEdit,
  type Side,
} from '../../../project/index.ts';
import { figure } from '../../format/index.ts';
import { useApp } from '../../state/index.ts';
import type { PlanDrawingProps } from './plan-drawing.tsx';
import { edgesOf, type PlanScale, snapTo } from './plan-scale.ts';

export type Grabbed =
  | { readonly kind: 'room'; readonly place: PlanRoom }
  | { readonly kind: 'side'; readonly place: PlanRoom; readonly side: Side }
  | { readonly kind: 'window'; readonly place: PlanRoom; readonly side: Side }
  | {
      readonly kind: 'opening';
      readonly place: PlanRoom;
      readonly side: Side;
      readonly id: string;
      readonly leftM: number;
    }
  | { readonly kind: 'new' };

interface Point {
  readonly x: number;
  readonly y: number;
}

const leastRoomM = 0.5;
const round = (value: number) => Number(value.toFixed(4));

/** Along a side, from its left end as seen from inside. */
function alongM(place: PlanRoom, side: Side, { x, y }: Point): number {
  if (side === 'top') return x - place.xM;
  if (side === 'bottom') return place.xM + place.widthM - x;
  if (side === 'right') return place.yM + place.depthM - y;
  return y - place.yM;
}

export function usePlanDrag(props: PlanDrawingProps, scale: PlanScale) {
  const { form, plan, snapM, onDraw } = props;
  const app = useApp();
  const held = useRef<{ readonly what: Grabbed; readonly from: Point } | null>(null);
  const [fresh, setFresh] = useState<Omit<PlanRoom, 'room' | 'storey'> | null>(null);
  const [words, setWords] = useState('');

  function grab(from: Point, what: Grabbed) {
    held.current = { what, from };
    if (what.kind === 'new') return;
    app.choose('plan', what.place.room);
    if (what.kind !== 'window') return;
    const edit = addWindow(form, plan, what.place, what.side, alongM(what.place, what.side, from));
    if (edit) app.edit(edit);
    else setWords('No outside wall there: windows need one.');
    held.current = null;
  }

  function move(to: Point) {
    if (!held.current) return;
    const { what, from } = held.current;
    const snap = (value: number, edges: readonly number[]) =>
      snapTo(value, snapM, edges, scale.pxPerM);
    if (what.kind === 'new') {
      const { xs, ys } = edgesOf(plan, new Set());
      const [x0, x1] = [snap(from.x, xs), snap(to.x, xs)];
      const [y0, y1] = [snap(from.y, ys), snap(to.y, ys)];
      const next = {
        xM: Math.min(x0.value, x1.value),
        yM: Math.min(y0.value, y1.value),
        widthM: round(Math.abs(x1.value - x0.value)),
        depthM: round(Math.abs(y1.value - y0.value)),
      };
      setFresh(next);
      const met = x1.met || y1.met;
      return setWords(
        `${figure(next.widthM, 2)} by ${figure(next.depthM, 2)} m${met ? `, ${met}` : ''}`,
      );
    }
    const { place } = what;
    if (what.kind === 'room') return moveRoom(place, from, to);
    if (what.kind === 'side') return moveSide(place, what.side, from, to);
    const room = form.rooms.find(({ id }) => id === place.room);
    if (what.kind !== 'opening' || !room) return;
    const by = alongM(place, what.side, to) - alongM(place, what.side, from);
    const left = snapTo(what.leftM + by, snapM, [], scale.pxPerM).value;
    const edit = moveWindow(plan, place, room, what.side, what.id, left);
    if (edit) app.edit(edit);
    setWords(`${figure(left, 2)} m from the left corner, seen from inside`);
  }

  function moveRoom(place: PlanRoom, from: Point, to: Point) {
    const { xs, ys } = edgesOf(plan, new Set([place.room]));
    const snapEither = (low: number, size: number, edges: readonly number[]) => {
      const first = snapTo(low, snapM, edges, scale.pxPerM);
      if (first.met) return first;
      const last = snapTo(low + size, snapM, edges, scale.pxPerM);
      return last.met ? { ...last, value: round(last.value - size) } : first;
    };
    const x = snapEither(place.xM + to.x - from.x, place.widthM, xs);
    const y = snapEither(place.yM + to.y - from.y, place.depthM, ys);
    const now = plan.rooms.find(({ room }) => room === place.room);
    if (now?.xM === x.value && now.yM === y.value) return;
    const next = { ...place, xM: x.value, yM: y.value };
    app.edit(placeEdit(form, plan, [next], `${nameOf(place)} moved`, `room ${place.room}`));
    setWords(x.met || y.met ? `moved, ${x.met || y.met}` : 'moved');
  }

  /** The side as it is now moves by what the pointer and the snap ask for. */
  function moveSide(place: PlanRoom, side: Side, from: Point, to: Point) {
    const now = plan.rooms.find(({ room }) => room === place.room);
    if (!now) return;
    const isAcross = side === 'left' || side === 'right';
    const { xs, ys } = edgesOf(plan, new Set([place.room]));
    const line = (one: PlanRoom) =>
      ({
        left: one.xM,
        right: one.xM + one.widthM,
        bottom: one.yM,
        top: one.yM + one.depthM,
      })[side];
    const wanted = line(place) + (isAcross ? to.x - from.x : to.y - from.y);
    // Neighbours that share the side have the same line; it must not hold itself.
    const others = (isAcross ? xs : ys).filter((edge) => Math.abs(edge - line(now)) > 1e-6);
    const { value, met } = snapTo(wanted, snapM, others, scale.pxPerM);
    const by = round(value - line(now));
    if (by === 0) return;
    const places = movedSide(plan, now, side, by);
    if (places.length === 0) return;
    const length = isAcross ? places[0]?.widthM : places[0]?.depthM;
    const words = `${nameOf(place)} to ${figure(length ?? 0, 2)} m`;
    app.edit(placeEdit(form, plan, places, words, `side ${place.room} ${side}`));
    setWords(met ? `${words}, ${met}` : words);
  }

  const nameOf = ({ room }: PlanRoom) => form.rooms.find(({ id }) => id === room)?.name ?? room;

  function drop() {
    const { what } = held.current ?? {};
    held.current = null;
    setWords('');
    if (what?.kind === 'new') {
      if (fresh && fresh.widthM >= leastRoomM && fresh.depthM >= leastRoomM) onDraw(fresh);
      setFresh(null);
    } else if (what) app.endGesture();
  }

  return { grab, move, drop, fresh, words };
}
