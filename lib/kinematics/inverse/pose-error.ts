import type { Transform } from '../transforms';

/** What is still missing: position (m), then a rotation vector (rad), or for a free roll the turn that lays z on z. */
export function poseError(pose: Transform, target: Transform, freeRoll: boolean, out: Float64Array) {
  out[0] = target[3] - pose[3];
  out[1] = target[7] - pose[7];
  out[2] = target[11] - pose[11];
  let sx: number;
  let sy: number;
  let sz: number;
  let cosine: number;
  if (freeRoll) {
    sx = pose[6] * target[10] - pose[10] * target[6];
    sy = pose[10] * target[2] - pose[2] * target[10];
    sz = pose[2] * target[6] - pose[6] * target[2];
    cosine = pose[2] * target[2] + pose[6] * target[6] + pose[10] * target[10];
  } else {
    // Half the sum of the cross products of matching axes: axis times sine of the turn from pose to target.
    sx = sy = sz = 0;
    let trace = 0;
    for (let c = 0; c < 3; c++) {
      sx += pose[4 + c] * target[8 + c] - pose[8 + c] * target[4 + c];
      sy += pose[8 + c] * target[c] - pose[c] * target[8 + c];
      sz += pose[c] * target[4 + c] - pose[4 + c] * target[c];
      trace += pose[c] * target[c] + pose[4 + c] * target[4 + c] + pose[8 + c] * target[8 + c];
    }
    sx /= 2;
    sy /= 2;
    sz /= 2;
    cosine = (trace - 1) / 2;
  }
  const sine = Math.hypot(sx, sy, sz);
  const angle = Math.atan2(sine, cosine);
  // Facing the other way the axis is undefined; any push off that spot will do.
  const scale = sine > 1e-12 ? angle / sine : 1;
  out[3] = sine > 1e-12 || cosine > 0 ? sx * scale : Math.PI;
  out[4] = sy * scale;
  out[5] = sz * scale;
}
