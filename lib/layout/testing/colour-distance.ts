/** A colour in CIELAB, as d3-color gives it. */
interface Lab {
  readonly l: number;
  readonly a: number;
  readonly b: number;
}

const DEGREES = 180 / Math.PI;

/** CIEDE2000 colour difference (CIE 142-2001; formula as in Sharma, Wu and Dalal 2005), all weights one. */
export function colourDistance(first: Lab, second: Lab): number {
  const meanChroma = (Math.hypot(first.a, first.b) + Math.hypot(second.a, second.b)) / 2;
  const g = 0.5 * (1 - Math.sqrt(meanChroma ** 7 / (meanChroma ** 7 + 25 ** 7)));
  const [a1, a2] = [first.a * (1 + g), second.a * (1 + g)];
  const [c1, c2] = [Math.hypot(a1, first.b), Math.hypot(a2, second.b)];
  const hue = (b: number, a: number) => (a === 0 && b === 0 ? 0 : (Math.atan2(b, a) * DEGREES + 360) % 360);
  const [h1, h2] = [hue(first.b, a1), hue(second.b, a2)];
  const isGrey = c1 * c2 === 0;

  let turn = isGrey ? 0 : h2 - h1;
  if (turn > 180) turn -= 360;
  if (turn < -180) turn += 360;
  const dL = second.l - first.l;
  const dC = c2 - c1;
  const dH = 2 * Math.sqrt(c1 * c2) * Math.sin(turn / 2 / DEGREES);

  const l = (first.l + second.l) / 2;
  const c = (c1 + c2) / 2;
  let h = isGrey ? h1 + h2 : (h1 + h2) / 2;
  if (!isGrey && Math.abs(h1 - h2) > 180) h += h1 + h2 < 360 ? 180 : -180;
  const cosine = (degrees: number) => Math.cos(degrees / DEGREES);
  const t = 1 - 0.17 * cosine(h - 30) + 0.24 * cosine(2 * h) + 0.32 * cosine(3 * h + 6) - 0.2 * cosine(4 * h - 63);
  const sL = 1 + (0.015 * (l - 50) ** 2) / Math.sqrt(20 + (l - 50) ** 2);
  const sC = 1 + 0.045 * c;
  const sH = 1 + 0.015 * c * t;
  const rC = 2 * Math.sqrt(c ** 7 / (c ** 7 + 25 ** 7));
  const rT = -rC * Math.sin((60 * Math.exp(-(((h - 275) / 25) ** 2))) / DEGREES);
  return Math.sqrt((dL / sL) ** 2 + (dC / sC) ** 2 + (dH / sH) ** 2 + rT * (dC / sC) * (dH / sH));
}
