/**
 * Two diagonals of a 6 × 6 matrix by Householder reflections (Golub & Kahan 1965), unrolled: reflections from the left clear a column below the
 * diagonal, those from the right a row beyond its neighbour, by turns. Reads `m` (row after row), writes the squares of the diagonal to `q` and of its
 * right neighbours to `e`. Loops over such short vectors cost three times as much.
 */
export function squaredBidiagonal(m: Float64Array, q: Float64Array, e: Float64Array) {
  let m00 = m[0];
  let m01 = m[1];
  let m02 = m[2];
  let m03 = m[3];
  let m04 = m[4];
  let m05 = m[5];
  const m10 = m[6];
  let m11 = m[7];
  let m12 = m[8];
  let m13 = m[9];
  let m14 = m[10];
  let m15 = m[11];
  const m20 = m[12];
  let m21 = m[13];
  let m22 = m[14];
  let m23 = m[15];
  let m24 = m[16];
  let m25 = m[17];
  const m30 = m[18];
  let m31 = m[19];
  let m32 = m[20];
  let m33 = m[21];
  let m34 = m[22];
  let m35 = m[23];
  const m40 = m[24];
  let m41 = m[25];
  let m42 = m[26];
  let m43 = m[27];
  let m44 = m[28];
  let m45 = m[29];
  const m50 = m[30];
  let m51 = m[31];
  let m52 = m[32];
  let m53 = m[33];
  let m54 = m[34];
  let m55 = m[35];
  // Column 1.
  const c0 = m00 * m00 + m10 * m10 + m20 * m20 + m30 * m30 + m40 * m40 + m50 * m50;
  q[0] = c0;
  if (c0 > 0) {
    const size = Math.sqrt(c0);
    m00 += m00 >= 0 ? size : -size;
    const scale = 1 / (size * Math.abs(m00));
    const d1 = scale * (m00 * m01 + m10 * m11 + m20 * m21 + m30 * m31 + m40 * m41 + m50 * m51);
    m01 -= d1 * m00;
    m11 -= d1 * m10;
    m21 -= d1 * m20;
    m31 -= d1 * m30;
    m41 -= d1 * m40;
    m51 -= d1 * m50;
    const d2 = scale * (m00 * m02 + m10 * m12 + m20 * m22 + m30 * m32 + m40 * m42 + m50 * m52);
    m02 -= d2 * m00;
    m12 -= d2 * m10;
    m22 -= d2 * m20;
    m32 -= d2 * m30;
    m42 -= d2 * m40;
    m52 -= d2 * m50;
    const d3 = scale * (m00 * m03 + m10 * m13 + m20 * m23 + m30 * m33 + m40 * m43 + m50 * m53);
    m03 -= d3 * m00;
    m13 -= d3 * m10;
    m23 -= d3 * m20;
    m33 -= d3 * m30;
    m43 -= d3 * m40;
    m53 -= d3 * m50;
    const d4 = scale * (m00 * m04 + m10 * m14 + m20 * m24 + m30 * m34 + m40 * m44 + m50 * m54);
    m04 -= d4 * m00;
    m14 -= d4 * m10;
    m24 -= d4 * m20;
    m34 -= d4 * m30;
    m44 -= d4 * m40;
    m54 -= d4 * m50;
    const d5 = scale * (m00 * m05 + m10 * m15 + m20 * m25 + m30 * m35 + m40 * m45 + m50 * m55);
    m05 -= d5 * m00;
    m15 -= d5 * m10;
    m25 -= d5 * m20;
    m35 -= d5 * m30;
    m45 -= d5 * m40;
    m55 -= d5 * m50;
  }
  // Row 1.
  const r0 = m01 * m01 + m02 * m02 + m03 * m03 + m04 * m04 + m05 * m05;
  e[0] = r0;
  if (r0 > 0) {
    const size = Math.sqrt(r0);
    m01 += m01 >= 0 ? size : -size;
    const scale = 1 / (size * Math.abs(m01));
    const d1 = scale * (m01 * m11 + m02 * m12 + m03 * m13 + m04 * m14 + m05 * m15);
    m11 -= d1 * m01;
    m12 -= d1 * m02;
    m13 -= d1 * m03;
    m14 -= d1 * m04;
    m15 -= d1 * m05;
    const d2 = scale * (m01 * m21 + m02 * m22 + m03 * m23 + m04 * m24 + m05 * m25);
    m21 -= d2 * m01;
    m22 -= d2 * m02;
    m23 -= d2 * m03;
    m24 -= d2 * m04;
    m25 -= d2 * m05;
    const d3 = scale * (m01 * m31 + m02 * m32 + m03 * m33 + m04 * m34 + m05 * m35);
    m31 -= d3 * m01;
    m32 -= d3 * m02;
    m33 -= d3 * m03;
    m34 -= d3 * m04;
    m35 -= d3 * m05;
    const d4 = scale * (m01 * m41 + m02 * m42 + m03 * m43 + m04 * m44 + m05 * m45);
    m41 -= d4 * m01;
    m42 -= d4 * m02;
    m43 -= d4 * m03;
    m44 -= d4 * m04;
    m45 -= d4 * m05;
    const d5 = scale * (m01 * m51 + m02 * m52 + m03 * m53 + m04 * m54 + m05 * m55);
    m51 -= d5 * m01;
    m52 -= d5 * m02;
    m53 -= d5 * m03;
    m54 -= d5 * m04;
    m55 -= d5 * m05;
  }
  // Column 2.
  const c1 = m11 * m11 + m21 * m21 + m31 * m31 + m41 * m41 + m51 * m51;
  q[1] = c1;
  if (c1 > 0) {
    const size = Math.sqrt(c1);
    m11 += m11 >= 0 ? size : -size;
    const scale = 1 / (size * Math.abs(m11));
    const d2 = scale * (m11 * m12 + m21 * m22 + m31 * m32 + m41 * m42 + m51 * m52);
    m12 -= d2 * m11;
    m22 -= d2 * m21;
    m32 -= d2 * m31;
    m42 -= d2 * m41;
    m52 -= d2 * m51;
    const d3 = scale * (m11 * m13 + m21 * m23 + m31 * m33 + m41 * m43 + m51 * m53);
    m13 -= d3 * m11;
    m23 -= d3 * m21;
    m33 -= d3 * m31;
    m43 -= d3 * m41;
    m53 -= d3 * m51;
    const d4 = scale * (m11 * m14 + m21 * m24 + m31 * m34 + m41 * m44 + m51 * m54);
    m14 -= d4 * m11;
    m24 -= d4 * m21;
    m34 -= d4 * m31;
    m44 -= d4 * m41;
    m54 -= d4 * m51;
    const d5 = scale * (m11 * m15 + m21 * m25 + m31 * m35 + m41 * m45 + m51 * m55);
    m15 -= d5 * m11;
    m25 -= d5 * m21;
    m35 -= d5 * m31;
    m45 -= d5 * m41;
    m55 -= d5 * m51;
  }
  // Row 2.
  const r1 = m12 * m12 + m13 * m13 + m14 * m14 + m15 * m15;
  e[1] = r1;
  if (r1 > 0) {
    const size = Math.sqrt(r1);
    m12 += m12 >= 0 ? size : -size;
    const scale = 1 / (size * Math.abs(m12));
    const d2 = scale * (m12 * m22 + m13 * m23 + m14 * m24 + m15 * m25);
    m22 -= d2 * m12;
    m23 -= d2 * m13;
    m24 -= d2 * m14;
    m25 -= d2 * m15;
    const d3 = scale * (m12 * m32 + m13 * m33 + m14 * m34 + m15 * m35);
    m32 -= d3 * m12;
    m33 -= d3 * m13;
    m34 -= d3 * m14;
    m35 -= d3 * m15;
    const d4 = scale * (m12 * m42 + m13 * m43 + m14 * m44 + m15 * m45);
    m42 -= d4 * m12;
    m43 -= d4 * m13;
    m44 -= d4 * m14;
    m45 -= d4 * m15;
    const d5 = scale * (m12 * m52 + m13 * m53 + m14 * m54 + m15 * m55);
    m52 -= d5 * m12;
    m53 -= d5 * m13;
    m54 -= d5 * m14;
    m55 -= d5 * m15;
  }
  // Column 3.
  const c2 = m22 * m22 + m32 * m32 + m42 * m42 + m52 * m52;
  q[2] = c2;
  if (c2 > 0) {
    const size = Math.sqrt(c2);
    m22 += m22 >= 0 ? size : -size;
    const scale = 1 / (size * Math.abs(m22));
    const d3 = scale * (m22 * m23 + m32 * m33 + m42 * m43 + m52 * m53);
    m23 -= d3 * m22;
    m33 -= d3 * m32;
    m43 -= d3 * m42;
    m53 -= d3 * m52;
    const d4 = scale * (m22 * m24 + m32 * m34 + m42 * m44 + m52 * m54);
    m24 -= d4 * m22;
    m34 -= d4 * m32;
    m44 -= d4 * m42;
    m54 -= d4 * m52;
    const d5 = scale * (m22 * m25 + m32 * m35 + m42 * m45 + m52 * m55);
    m25 -= d5 * m22;
    m35 -= d5 * m32;
    m45 -= d5 * m42;
    m55 -= d5 * m52;
  }
  // Row 3.
  const r2 = m23 * m23 + m24 * m24 + m25 * m25;
  e[2] = r2;
  if (r2 > 0) {
    const size = Math.sqrt(r2);
    m23 += m23 >= 0 ? size : -size;
    const scale = 1 / (size * Math.abs(m23));
    const d3 = scale * (m23 * m33 + m24 * m34 + m25 * m35);
    m33 -= d3 * m23;
    m34 -= d3 * m24;
    m35 -= d3 * m25;
    const d4 = scale * (m23 * m43 + m24 * m44 + m25 * m45);
    m43 -= d4 * m23;
    m44 -= d4 * m24;
    m45 -= d4 * m25;
    const d5 = scale * (m23 * m53 + m24 * m54 + m25 * m55);
    m53 -= d5 * m23;
    m54 -= d5 * m24;
    m55 -= d5 * m25;
  }
  // Column 4.
  const c3 = m33 * m33 + m43 * m43 + m53 * m53;
  q[3] = c3;
  if (c3 > 0) {
    const size = Math.sqrt(c3);
    m33 += m33 >= 0 ? size : -size;
    const scale = 1 / (size * Math.abs(m33));
    const d4 = scale * (m33 * m34 + m43 * m44 + m53 * m54);
    m34 -= d4 * m33;
    m44 -= d4 * m43;
    m54 -= d4 * m53;
    const d5 = scale * (m33 * m35 + m43 * m45 + m53 * m55);
    m35 -= d5 * m33;
    m45 -= d5 * m43;
    m55 -= d5 * m53;
  }
  // Row 4.
  const r3 = m34 * m34 + m35 * m35;
  e[3] = r3;
  if (r3 > 0) {
    const size = Math.sqrt(r3);
    m34 += m34 >= 0 ? size : -size;
    const scale = 1 / (size * Math.abs(m34));
    const d4 = scale * (m34 * m44 + m35 * m45);
    m44 -= d4 * m34;
    m45 -= d4 * m35;
    const d5 = scale * (m34 * m54 + m35 * m55);
    m54 -= d5 * m34;
    m55 -= d5 * m35;
  }
  // Column 5.
  const c4 = m44 * m44 + m54 * m54;
  q[4] = c4;
  if (c4 > 0) {
    const size = Math.sqrt(c4);
    m44 += m44 >= 0 ? size : -size;
    const scale = 1 / (size * Math.abs(m44));
    const d5 = scale * (m44 * m45 + m54 * m55);
    m45 -= d5 * m44;
    m55 -= d5 * m54;
  }
  e[4] = m45 * m45;
  q[5] = m55 * m55;
}
