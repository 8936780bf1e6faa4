import { REASONS, type MapTile } from '../types';

/**
 * A tile as bytes, little-endian: format byte, three reserved bytes, rowFrom, rowTo and columns as 32-bit whole numbers; then a byte a
 * cell for reason, binding joint and branch, padding to a multiple of four, and four 32-bit floats' planes in the order below. The second format has
 * one more plane, the wrist coverage; the first leaves it out where it only repeats which cells are reached.
 */

const PLAIN_FORMAT = 1;
const COVERAGE_FORMAT = 2;
const HEADER = 16;
const BYTE_PLANES = ['reason', 'bindingJoint', 'branch'] as const;
const PLAIN_PLANES = ['inverseConditionNumber', 'maximumToolSpeed', 'sureSpeed', 'limitShare'] as const;
const COVERAGE_PLANES = [...PLAIN_PLANES, 'wristCoverage'] as const;

const padded = (length: number) => (length + 3) & ~3;

function sizeOf(cells: number, planes: readonly string[]): number {
  return HEADER + padded(BYTE_PLANES.length * cells) + 4 * planes.length * cells;
}

/** Whether the coverage says no more than which cells are reached. */
function isPlain({ reason, wristCoverage }: MapTile): boolean {
  return wristCoverage.every((share, i) => share === (reason[i] === 0 ? 1 : 0));
}

export function encodeMapTile(tile: MapTile): Uint8Array {
  const cells = (tile.rowTo - tile.rowFrom) * tile.columns;
  const plain = isPlain(tile);
  const planes = plain ? PLAIN_PLANES : COVERAGE_PLANES;
  const bytes = new Uint8Array(sizeOf(cells, planes));
  const view = new DataView(bytes.buffer);
  bytes[0] = plain ? PLAIN_FORMAT : COVERAGE_FORMAT;
  view.setUint32(4, tile.rowFrom, true);
  view.setUint32(8, tile.rowTo, true);
  view.setUint32(12, tile.columns, true);
  BYTE_PLANES.forEach((plane, index) => bytes.set(tile[plane], HEADER + index * cells));
  let at = HEADER + padded(BYTE_PLANES.length * cells);
  for (const plane of planes) {
    for (let i = 0; i < cells; i++, at += 4) view.setFloat32(at, tile[plane][i], true);
  }
  return bytes;
}

/** Throws a RangeError that says what is wrong where the bytes are no whole tile of a known format. */
export function decodeMapTile(bytes: Uint8Array): MapTile {
  if (bytes.length < HEADER) throw new RangeError('A map tile is cut short.');
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  if (bytes[0] !== PLAIN_FORMAT && bytes[0] !== COVERAGE_FORMAT)
    throw new RangeError(`A map tile has the unknown format ${bytes[0]}.`);
  const planes = bytes[0] === PLAIN_FORMAT ? PLAIN_PLANES : COVERAGE_PLANES;
  const rowFrom = view.getUint32(4, true);
  const rowTo = view.getUint32(8, true);
  const columns = view.getUint32(12, true);
  const cells = (rowTo - rowFrom) * columns;
  if (rowTo < rowFrom || sizeOf(cells, planes) !== bytes.length)
    throw new RangeError('A map tile has the wrong length.');
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
    wristCoverage: bytes[0] === COVERAGE_FORMAT ? floatPlane(4) : reachedAsCoverage(reason),
  };
}

const reachedAsCoverage = (reason: Uint8Array): Float32Array =>
  Float32Array.from(reason, (code) => (code === 0 ? 1 : 0));

/** An empty tile to be filled: all values NaN. */
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
    wristCoverage: new Float32Array(cells),
  };
}
