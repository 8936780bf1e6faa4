'use client';

import { useMemo, useReducer } from 'react';
import {
  draftOf,
  emptyDraft,
  missingHandle,
  pointOf,
  readDraft,
  stepOf,
  withDistance,
  withoutLine,
  withPoint,
  type CalibrationDraft,
  type Handle,
  type LineName,
  type StepName,
} from '@/lib/layout/calibration-draft';
import type { PicturePoint } from '@/lib/layout/picture-view';
import type { FloorPlan } from '@/lib/contracts/floor-plans';

interface State {
  draft: CalibrationDraft;
  step: StepName;
  /** The point that a click places, or that arrow keys move once it is there. */
  selected: Handle | null;
  changed: boolean;
}

type Action =
  | { type: 'openStep'; step: StepName }
  | { type: 'select'; handle: Handle | null }
  | { type: 'place'; point: PicturePoint }
  | { type: 'move'; handle: Handle; point: PicturePoint }
  | { type: 'distance'; line: LineName; distanceMm: number | null }
  | { type: 'clear'; line: LineName }
  | { type: 'copyLine'; from: LineName; to: LineName }
  | { type: 'saved' };

function start({ calibration, heightPx }: FloorPlan): State {
  const draft = calibration ? draftOf(calibration) : emptyDraft(heightPx);
  return { draft, step: 'scale', selected: missingHandle(draft, 'scale'), changed: false };
}

function reduce(state: State, action: Action): State {
  const { draft, selected } = state;
  switch (action.type) {
    case 'openStep':
      return {
        ...state,
        step: action.step,
        selected: action.step === 'origin' ? 'origin' : missingHandle(draft, action.step),
      };
    case 'select':
      return { ...state, selected: action.handle, step: action.handle ? stepOf(action.handle) : state.step };
    case 'place': {
      if (!selected) return state;
      const placed = withPoint(draft, selected, action.point);
      return { ...state, draft: placed, selected: missingHandle(placed, stepOf(selected)) ?? selected, changed: true };
    }
    case 'move':
      return {
        ...state,
        draft: withPoint(draft, action.handle, action.point),
        selected: action.handle,
        step: stepOf(action.handle),
        changed: true,
      };
    case 'distance':
      return { ...state, draft: withDistance(draft, action.line, action.distanceMm), changed: true };
    case 'clear': {
      const cleared = withoutLine(draft, action.line);
      return {
        ...state,
        draft: cleared,
        step: action.line,
        selected: missingHandle(cleared, action.line),
        changed: true,
      };
    }
    case 'copyLine': {
      const { fromPx, toPx } = draft[action.from];
      return {
        ...state,
        draft: { ...draft, [action.to]: { ...draft[action.to], fromPx, toPx } },
        selected: null,
        changed: true,
      };
    }
    case 'saved':
      return { ...state, changed: false };
  }
}

/** Keeps a point inside the picture and to a hundredth of a pixel. */
function inside({ widthPx, heightPx }: FloorPlan, [x, y]: PicturePoint): PicturePoint {
  const fit = (value: number, most: number): number => Math.round(Math.min(most, Math.max(0, value)) * 100) / 100;
  return [fit(x, widthPx), fit(y, heightPx)];
}

/** A floor plan being set to scale: the draft, the step, the selected point, and the deeds on them. */
export function useCalibration(floorPlan: FloorPlan) {
  const [state, dispatch] = useReducer(reduce, floorPlan, start);
  const reading = useMemo(() => readDraft(state.draft), [state.draft]);
  const deeds = useMemo(
    () => ({
      openStep: (step: StepName) => dispatch({ type: 'openStep', step }),
      select: (handle: Handle | null) => dispatch({ type: 'select', handle }),
      place: (point: PicturePoint) => dispatch({ type: 'place', point: inside(floorPlan, point) }),
      move: (handle: Handle, point: PicturePoint) =>
        dispatch({ type: 'move', handle, point: inside(floorPlan, point) }),
      setDistance: (line: LineName, distanceMm: number | null) => dispatch({ type: 'distance', line, distanceMm }),
      clear: (line: LineName) => dispatch({ type: 'clear', line }),
      copyLine: (from: LineName, to: LineName) => dispatch({ type: 'copyLine', from, to }),
      saved: () => dispatch({ type: 'saved' }),
    }),
    [floorPlan],
  );
  /** A click on the picture places the selected point: one that has not been picked yet, or the origin, which is always somewhere. */
  const isPicking =
    state.selected !== null && (state.selected === 'origin' || pointOf(state.draft, state.selected) === null);
  return { ...state, ...reading, isPicking, deeds };
}

export type CalibrationInHand = ReturnType<typeof useCalibration>;
