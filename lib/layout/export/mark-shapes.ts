import type { PointMm } from '../geometry';
import type { Dimension, Note, SectionLine } from '../items';
import { LINE_PITCH, noteLines } from '../note-lines';
import { detail, onFloor, uprightDeg, type Shape } from './shapes';

/** Extension lines, the dimension line with its arrows, and the length in mm. */
export function dimensionShapes(dimension: Dimension): Shape[] {
  const { fromMm, toMm, offsetMm } = dimension;
  const length = Math.hypot(toMm[0] - fromMm[0], toMm[1] - fromMm[1]);
  if (length === 0) return [];
  const [ux, uy] = [(toMm[0] - fromMm[0]) / length, (toMm[1] - fromMm[1]) / length];
  const off = ([x, y]: PointMm, by: number): PointMm => [x - uy * by, y + ux * by];
  const beyond = offsetMm + Math.sign(offsetMm || 1) * 40;
  const [from, to] = [off(fromMm, offsetMm), off(toMm, offsetMm)];
  const arrow = (tip: PointMm, direction: number): PointMm[] => {
    const size = Math.min(120, length / 4) * direction;
    const back: PointMm = [tip[0] + ux * size, tip[1] + uy * size];
    return [off(back, size / 4), tip, off(back, -size / 4)];
  };
  const turn = (Math.atan2(uy, ux) * 180) / Math.PI + dimension.angleDeg;
  const [middle] = onFloor(dimension, [[(from[0] + to[0]) / 2, (from[1] + to[1]) / 2]]);
  return [
    detail(dimension, 'DIMENSIONS', [fromMm, off(fromMm, beyond)]),
    detail(dimension, 'DIMENSIONS', [toMm, off(toMm, beyond)]),
    detail(dimension, 'DIMENSIONS', [from, to]),
    detail(dimension, 'DIMENSIONS', arrow(from, 1), 'arrow'),
    detail(dimension, 'DIMENSIONS', arrow(to, -1), 'arrow'),
    {
      kind: 'words',
      layer: 'DIMENSIONS',
      itemId: dimension.id,
      of: 'dimension',
      at: middle,
      angleDeg: uprightDeg(turn),
      text: String(Math.round(length)),
    },
  ];
}

/** The cut with its letter at either end, and ticks on the side from which it is seen. */
export function sectionShapes(section: SectionLine): Shape[] {
  const { fromMm, toMm, letter } = section;
  const length = Math.hypot(toMm[0] - fromMm[0], toMm[1] - fromMm[1]) || 1;
  const u = [(toMm[0] - fromMm[0]) / length, (toMm[1] - fromMm[1]) / length];
  const tick = ([x, y]: PointMm): PointMm => [x - u[1] * 150, y + u[0] * 150];
  const ends = onFloor(section, [fromMm, toMm]);
  return [
    detail(section, 'SECTIONS', [fromMm, toMm]),
    detail(section, 'SECTIONS', [fromMm, tick(fromMm)]),
    detail(section, 'SECTIONS', [toMm, tick(toMm)]),
    ...ends.map((at): Shape => ({
      kind: 'words',
      layer: 'SECTIONS',
      itemId: section.id,
      of: 'sectionLine',
      at,
      angleDeg: 0,
      text: letter,
    })),
  ];
}

/** Each line of a note by itself. */
export function noteShapes(note: Note): Shape[] {
  const lines = noteLines(note);
  const places = onFloor(
    note,
    lines.map((_, index) => [0, -note.sizeMm * (1 + LINE_PITCH * index)] as PointMm),
  );
  return lines.map((text, index) => ({
    kind: 'words',
    layer: 'NOTES',
    itemId: note.id,
    of: 'note',
    at: places[index],
    angleDeg: note.angleDeg,
    text,
    heightMm: note.sizeMm,
  }));
}
