import { along, cross, dot, length, minus, nearestOnFirst, type Triple } from '@/lib/kinematics/inverse/lines';
import { identityTransform, invertTransform, multiplyTransforms, type Transform } from '@/lib/kinematics/transforms';
import type { Frame, Joint } from '@/lib/kinematics/types';
import { frameOf } from '../tool-orientation';

/** A joint's axis with the chain at zero, in the frame of its base: a point on it and its unit direction (m). */
export interface AxisLine {
  readonly type: Joint['type'];
  readonly point: Triple;
  readonly direction: Triple;
}

export interface DhRow {
  readonly a: number;
  readonly alpha: number;
  readonly d: number;
  readonly theta: number;
}

export interface DhChain {
  readonly rows: readonly DhRow[];
  readonly base?: Frame;
  readonly tool?: Frame;
}

/** Sine below which two axes are parallel, and length (m) below which they meet. */
const PARALLEL = 1e-11;
const MEETING = 1e-10;

interface Station {
  readonly origin: Triple;
  readonly x: Triple;
  readonly z: Triple;
}

/**
 * Standard Denavit-Hartenberg rows of a serial chain, from its axes (Denavit & Hartenberg 1955): x along the common normal of
 * each axis and the next. A base and a tool transform take up what rows cannot say, so every chain can be written so. Of the
 * choices that the convention leaves open those are taken that keep the numbers plain.
 */
export function dhRowsOf(axes: readonly AxisLine[], tip: Transform): DhChain {
  const first = firstStation(axes[0]);
  const rows: DhRow[] = [];
  let station = first;
  for (let i = 0; i + 1 < axes.length; i++) {
    const next = nextStation(station, axes[i + 1]);
    rows.push(rowBetween(station, next));
    station = next;
  }
  const last = lastStation(station, tip);
  rows.push(rowBetween(station, last));
  const rest = multiplyTransforms(invertTransform(transformAt(last), identityTransform()), tip, identityTransform());
  return { rows, base: frameUnlessIdentity(transformAt(first)), tool: frameUnlessIdentity(rest) };
}

/** On the first axis, as near to the base's origin as it comes, x as near to the base's x as it can be. */
function firstStation({ point, direction: z }: AxisLine): Station {
  const origin = along(point, z, -dot(point, z));
  return { origin, z, x: levelled([1, 0, 0], z) ?? levelled([0, 1, 0], z)! };
}

/** The part of a direction at right angles to `z`, as a unit vector; null where hardly any is left. */
function levelled(wish: Triple, z: Triple): Triple | null {
  const part = along(wish, z, -dot(wish, z));
  const size = length(part);
  return size > 1e-6 ? scaled(part, 1 / size) : null;
}

const scaled = (vector: Triple, by: number): Triple => [vector[0] * by, vector[1] * by, vector[2] * by];

function nextStation(from: Station, next: AxisLine): Station {
  const z = next.direction;
  // Only the direction of a sliding axis counts, so it may be laid through where the chain has come to.
  const point = next.type === 'prismatic' ? from.origin : next.point;
  const normal = cross(from.z, z);
  const sine = length(normal);
  if (sine < PARALLEL) {
    const between = minus(point, from.origin);
    const aside = along(between, from.z, -dot(between, from.z));
    const a = length(aside);
    return { origin: along(from.origin, aside, 1), z, x: a > MEETING ? scaled(aside, 1 / a) : from.x };
  }
  const unit = scaled(normal, 1 / sine);
  const origin = nearestOnFirst(point, z, from.origin, from.z)!;
  const foot = nearestOnFirst(from.origin, from.z, point, z)!;
  const a = dot(minus(origin, foot), unit);
  // Meeting axes leave the sense of x open: the one that turns least from the x before.
  const sense = Math.abs(a) > MEETING ? Math.sign(a) : dot(unit, from.x) < -1e-9 ? -1 : 1;
  return { origin, z, x: scaled(unit, sense) };
}

/** Behind the last axis the tip itself where a row can say it, else the same axis level with the tip. */
function lastStation(from: Station, tip: Transform): Station {
  const at: Triple = [tip[3], tip[7], tip[11]];
  const shift = dot(minus(at, from.origin), from.z);
  const origin = along(from.origin, from.z, shift);
  const onAxis = length(minus(at, origin)) < MEETING;
  const tipZ: Triple = [tip[2], tip[6], tip[10]];
  const alike = dot(tipZ, from.z) > 0 && length(cross(tipZ, from.z)) < PARALLEL;
  const tipX: Triple = [tip[0], tip[4], tip[8]];
  if (onAxis && alike) return { origin: at, z: from.z, x: levelled(tipX, from.z) ?? from.x };
  return { origin, z: from.z, x: from.x };
}

function rowBetween(from: Station, to: Station): DhRow {
  const y = cross(from.z, from.x);
  const between = minus(to.origin, from.origin);
  return {
    a: tidy(dot(between, to.x), 1e-9),
    alpha: tidy(Math.atan2(dot(cross(from.z, to.z), to.x), dot(from.z, to.z)), Math.PI / 180),
    d: tidy(dot(between, from.z), 1e-9),
    theta: tidy(Math.atan2(dot(to.x, y), dot(to.x, from.x)), Math.PI / 180),
  };
}

/** Rounding noise taken off: the nearest whole step where it is next to nothing away. */
function tidy(value: number, step: number): number {
  const steps = Math.round(value / step);
  // 345 mm as 0.345 and not as 345 times 0.001.
  const whole = step === 1e-9 ? steps / 1e9 : steps * step;
  return Math.abs(whole - value) < 1e-12 ? (whole === 0 ? 0 : whole) : value;
}

function transformAt({ origin, x, z }: Station): Transform {
  const y = cross(z, x);
  return Float64Array.of(x[0], y[0], z[0], origin[0], x[1], y[1], z[1], origin[1], x[2], y[2], z[2], origin[2]);
}

function frameUnlessIdentity(transform: Transform): Frame | undefined {
  if (transform.every((value, index) => Math.abs(value - (index % 5 === 0 ? 1 : 0)) < 1e-12)) return undefined;
  const { xyz, rpy } = frameOf(transform);
  const [x, y, z] = xyz.map((value) => tidy(value, 1e-9));
  const [rx, ry, rz] = rpy.map((value) => tidy(value, Math.PI / 180));
  return { xyz: [x, y, z], rpy: [rx, ry, rz] };
}
