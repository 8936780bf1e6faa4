import type { Arm, Joint } from '../types';

interface TrackData {
  /** Travel to either side of the middle (m), m/s and m/s². */
  readonly halfTravel: number;
  readonly speed: number;
  readonly ramp: number;
}

/**
 * Stands an arm given in standard rows on a track along the y axis, the base in the middle of its travel. The result is in Craig's rows, where a
 * first joint can slide level: row i takes its length and twist from the standard row before it.
 */
export function onTrack(arm: Arm, track: TrackData): Arm {
  const last = arm.joints[arm.joints.length - 1];
  if (arm.convention !== 'standard' || last.a !== 0 || last.alpha !== 0)
    throw new RangeError('Only an arm in standard rows that ends without a length and a twist can be put on a track.');
  const slide: Joint = {
    type: 'prismatic',
    a: 0,
    alpha: -Math.PI / 2,
    d: 0,
    theta: 0,
    min: -track.halfTravel,
    max: track.halfTravel,
    maxSpeed: track.speed,
    maxAcceleration: track.ramp,
  };
  const turns = arm.joints.map((joint, index): Joint => {
    // The first axis stands upright again.
    const { a, alpha } = index === 0 ? { a: 0, alpha: Math.PI / 2 } : arm.joints[index - 1];
    return { ...joint, a, alpha };
  });
  return { ...arm, convention: 'modified', joints: [slide, ...turns] };
}
