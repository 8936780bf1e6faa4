import type { Robot } from './items';

/** Standard gravity, m/s² (ISO 80000-3:2019; from memory). */
const GRAVITY = 9.80665;

/** A figure against what the data sheet allows; `rated` is null where nobody has typed it, and then nothing is checked. */
export interface RatedFigure {
  readonly value: number;
  readonly rated: number | null;
  /** Rated less value; null where there is no rating. */
  readonly margin: number | null;
}

/** A value that is missing, and the question to put at its field. */
export interface PayloadQuestion {
  readonly field: 'toolMass' | 'part' | 'payload' | 'centre' | 'inertia' | 'rating';
  readonly words: string;
}

export interface PayloadCheck {
  readonly massKg: RatedFigure;
  /** Static moment about the flange with the arm of the load level, N m; null where a centre of mass is not known. */
  readonly momentNm: RatedFigure | null;
  /** Largest moment of inertia about an axis through the flange's middle, kg m²; null where a centre or an inertia is not known. */
  readonly inertiaKgM2: RatedFigure | null;
  /** True where every figure that can be checked is within its rating, false where one is not, null where none can be checked. */
  readonly within: boolean | null;
  readonly questions: readonly PayloadQuestion[];
  readonly caution: string;
}

/** Tool plus part against the arm's rating. `payloadKg`: of the arm; null where its data do not say. */
export function checkPayload(
  robot: Pick<Robot, 'tool' | 'part' | 'wristRating'>,
  payloadKg: number | null,
): PayloadCheck {
  const { tool, part, wristRating } = robot;
  const bodies = part ? [tool, part] : [tool];
  const questions: PayloadQuestion[] = [];
  if (payloadKg === null)
    questions.push({ field: 'payload', words: 'What may this arm carry? Write its payload in the arm library.' });
  if (tool.massKg === 0) questions.push({ field: 'toolMass', words: 'What does the tool weigh? Write its mass.' });
  if (!part)
    questions.push({
      field: 'part',
      words: 'What does the robot carry? Write the mass of the part, or 0 where it carries none.',
    });
  else if (part.massKg === 0)
    questions.push({ field: 'part', words: 'The part weighs 0 kg: the robot is taken to carry nothing but its tool.' });

  const loaded = bodies.filter(({ massKg }) => massKg > 0);
  const hasCentres = loaded.length > 0 && loaded.every(({ centreMm }) => isTyped(centreMm));
  const hasInertia = hasCentres && loaded.every(({ inertiaKgM2 }) => isTyped(inertiaKgM2));
  if (loaded.length > 0 && !hasCentres)
    questions.push({
      field: 'centre',
      words: 'Where are the centres of mass of tool and part? Without them moment and inertia are not checked.',
    });
  else if (hasCentres && !hasInertia)
    questions.push({
      field: 'inertia',
      words: 'What are the moments of inertia of tool and part? Without them inertia is not checked.',
    });
  if (hasCentres && [wristRating?.momentNm ?? null, wristRating?.inertiaKgM2 ?? null].includes(null))
    questions.push({
      field: 'rating',
      words: 'What moment and inertia does the data sheet allow at the flange? Without them they are not checked.',
    });

  // A tool whose mass nobody has typed is no tool of 0 kg: nothing is held against the rating until it is known.
  const massKg = against(
    bodies.reduce((sum, body) => sum + body.massKg, 0),
    tool.massKg === 0 ? null : payloadKg,
  );
  const momentNm = hasCentres
    ? against(GRAVITY * Math.hypot(...firstMoment(loaded)), wristRating?.momentNm ?? null)
    : null;
  const inertiaKgM2 = hasInertia
    ? against(
        loaded.reduce((sum, body) => sum + inertiaAboutFlange(body), 0),
        wristRating?.inertiaKgM2 ?? null,
      )
    : null;
  const margins = [massKg, momentNm, inertiaKgM2].flatMap((figure) => figure?.margin ?? []);
  return {
    massKg,
    momentNm,
    inertiaKgM2,
    within: margins.length === 0 ? null : margins.every((margin) => margin >= 0),
    questions,
    caution:
      inertiaKgM2?.margin === undefined || inertiaKgM2.margin === null
        ? 'Inertia is not checked: enter centres of mass, moments of inertia and the rating of the wrist. Masses alone do not show that an arm carries a load.'
        : 'Checked at the flange against the ratings typed in. The load diagram of the data sheet may allow less farther out.',
  };
}

/** Nothing but zeros is what an empty form holds: no body has its mass in the flange, or no inertia. */
const isTyped = (values: object | null): boolean =>
  values !== null && Object.values(values).some((value) => value !== 0);

type Body = Pick<Robot['tool'], 'massKg' | 'centreMm' | 'inertiaKgM2'>;

const against = (value: number, rated: number | null): RatedFigure => ({
  value,
  rated,
  margin: rated === null ? null : rated - value,
});

/** Mass times place of the centre, kg m, for each axis of the flange. */
function firstMoment(bodies: readonly Body[]): [number, number, number] {
  const sum: [number, number, number] = [0, 0, 0];
  for (const { massKg, centreMm } of bodies) {
    if (!centreMm) continue;
    [centreMm.xMm, centreMm.yMm, centreMm.zMm].forEach((value, axis) => (sum[axis] += (massKg * value) / 1000));
  }
  return sum;
}

/** Largest own moment of inertia plus mass times distance squared (Huygens-Steiner): never less than about any axis through the flange. */
function inertiaAboutFlange({ massKg, centreMm, inertiaKgM2 }: Body): number {
  if (!centreMm || !inertiaKgM2) return 0;
  const distance = Math.hypot(centreMm.xMm, centreMm.yMm, centreMm.zMm) / 1000;
  return Math.max(inertiaKgM2.xx, inertiaKgM2.yy, inertiaKgM2.zz) + massKg * distance * distance;
}
