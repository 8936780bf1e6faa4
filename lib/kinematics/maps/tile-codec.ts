import { REASONS, type MapTile } from '../types';

/**
 * A tile as bytes, little-endian: format byte, three reserved bytes, rowFrom, rowTo and columns as 32-bit whole numbers; then a byte a
 * cell for reason, binding joint and branch, padding to a multiple of four, and four 32-bit floats' planes in the order below.
 */

const FORMAT = 1;
const HEADER = 16;
const BYTE_PLANES = ['reason', 'bindingJoint', 'branch'] as const;
const FLOAT_PLANES = ['inverseConditionNumber', 'maximumToolSpeed', 'sureSpeed', 'limitShare'] as const;

const padded = (length: number) => (length + 3) & ~3;

function sizeOf(cells: number): number {
  return HEADER + padded(BYTE_PLANES.length * cells) + 4 * FLOAT_PLANES.length * cells;
}

export function encodeMapTile(tile: MapTile): Uint8Array {
  const cells = (tile.rowTo - tile.rowFrom) * tile.columns;
  const bytes = new Uint8Array(sizeOf(cells));
  const view = new DataView(bytes.buffer);
  bytes[0] = FORMAT;
  view.setUint32(4, tile.rowFrom, true);
  view.setUint32(8, tile.rowTo, true);
  view.setUint32(12, tile.columns, true);
  BYTE_PLANES.forEach((plane, index) => bytes.set(tile[plane], HEADER + index * cells));
  let at = HEADER + padded(BYTE_PLANES.length * cells);
  for (const plane of FLOAT_PLANES) {
    for (let i = 0; i < cells; i++, at += 4) view.setFloat32(at, tile[plane][i], true);
  }
  return bytes;
}

/** Throws a RangeError that says what is wrong where the bytes are no whole tile of a known format. */
export function decodeMapTile(bytes: Uint8Array): MapTile {
  if (bytes.length < HEADER) throw new RangeError('A map tile is cut short.');
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  if (bytes[0] !== FORMAT) throw new RangeError(`A map tile has the unknown format ${bytes[0]}.`);
  const rowFrom = view.getUint32(4, true);
  const rowTo = view.getUint32(8, true);
  const columns = view.getUint32(12, true);
  const cells = (rowTo - rowFrom) * columns;
  if (rowTo < rowFrom || sizeOf(cells) !== bytes.length) throw new RangeError('A map tile has the wrong length.');
  const plane = (index: number) => bytes.slice(HEADER + index * cells, HEADER + (index + 1) * cells);
  const reason = plane(0);
  if (reason.some((code) => code >= REASONS.length))
    throw new RangeError('A map tile holds a reason that is not known.');
  const floats = HEADER + padded(BYTE_PLANES.length * cells);
  const floatPlane = (index: number) => {
    const start = floats + 4 * cells * index;
    return Float32Array.from({ length: cells }, (_, i) => view.getFloat32(start + 4 * i, true));
  };
  return {
    rowFrom,
    rowTo,
    columns,
    reason,
    bindingJoint: plane(1),
    branch: plane(2),
    inverseConditionNumber: floatPlane(0),
    maximumToolSpeed: floatPlane(1),
    sureSpeed: floatPlane(2),
    limitShare: floatPlane(3),
  };
}

/** An empty tile: nothing reached, all values NaN. */
export function makeMapTile(rowFrom: number, rowTo: number, columns: number): MapTile {
  const cells = (rowTo - rowFrom) * columns;
  return {
    rowFrom,
    rowTo,
    columns,
    reason: new Uint8Array(cells),
    bindingJoint: new Uint8Array(cells),
    branch: new Uint8Array(cells),
    inverseConditionNumber: new Float32Array(cells).fill(NaN),
    maximumToolSpeed: new Float32Array(cells).fill(NaN),
    sureSpeed: new Float32Array(cells).fill(NaN),
    limitShare: new Float32Array(cells).fill(NaN),
  };
}
