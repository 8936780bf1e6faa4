import type { Arm, WristMode } from '@/lib/kinematics/types';
import { itemToFloor } from '../geometry';
import type { Fixture, Item, Robot } from '../items';
import { patternPlaces } from '../judging/places';
import { reachRadius } from '../reach-radius';
import { armWithTool } from '../robot-frame';
import { commonBox, gridOver, tidy } from './grid-over';
import { takenOutlines } from './taken-floor';
import type { MapSettings } from '../map-settings';
import type { ErrorGainQuestion, StandingQuestion, ToleranceQuestion, WorkPoint } from './question';
import { squareMm } from './standing-map';

/** From a sheet to the question of a study. */

/** A task point, or a place of a pattern, of the work that is studied. */
export interface NamedWork {
  readonly id: string;
  readonly name: string;
  readonly fixtureId: string;
  readonly point: WorkPoint;
}

/**
 * The points of a robot: those given to it by hand, and of those left to the best robot the ones in `best`.
 * @param best ids of task points and patterns that this robot does best as drawn.
 */
export function workOfRobot(items: readonly Item[], robotId: string, best: ReadonlySet<string>): NamedWork[] {
  const isTheirs = (entry: { id: string; robotId: string | null }) =>
    entry.robotId === null ? best.has(entry.id) : entry.robotId === robotId;
  return items
    .filter((item): item is Fixture => item.kind === 'fixture' && !item.hidden)
    .flatMap((fixture) => [
      ...fixture.taskPoints.filter(isTheirs).map((point) => named(fixture, point.id, point.name, point)),
      ...fixture.taskPatterns
        .filter(isTheirs)
        .flatMap((pattern) =>
          patternPlaces(pattern).map((place) =>
            named(fixture, pattern.id, `${pattern.name} ${place.place}`, { ...pattern, ...place }),
          ),
        ),
    ]);
}

type Aimed = Omit<WorkPoint, 'fixture'>;

function named({ id: fixtureId, xMm, yMm, angleDeg }: Fixture, id: string, name: string, aimed: Aimed): NamedWork {
  const point: WorkPoint = {
    fixture: { xMm, yMm, angleDeg },
    xMm: aimed.xMm,
    yMm: aimed.yMm,
    zMm: aimed.zMm,
    tiltDeg: aimed.tiltDeg,
    azimuthDeg: aimed.azimuthDeg,
    rollDeg: aimed.rollDeg,
    speedMmS: aimed.speedMmS,
  };
  return { id, name, fixtureId, point };
}

function askedOf({ armId, tool, xMm, yMm, angleDeg, riserMm }: Robot, wrist: WristMode, work: readonly NamedWork[]) {
  const { xMm: x, yMm: y, zMm: z, rollDeg, pitchDeg, yawDeg } = tool;
  return {
    armId,
    tool: { xMm: x, yMm: y, zMm: z, rollDeg, pitchDeg, yawDeg },
    wrist,
    robot: { xMm, yMm, angleDeg, riserMm },
    points: work.map(({ point }) => point),
  };
}

export interface StandingOptions {
  readonly wrist: WristMode;
  readonly stepMm: number;
  /** Turns tried, evenly round; 1 keeps the drawn one. */
  readonly turns: number;
  readonly risersMm: readonly number[];
}

/** Where could this base stand? `halfPlateMm`: half the side of the base plate. */
export function standingOfRobot(
  items: readonly Item[],
  robot: Robot,
  arm: Arm,
  work: readonly NamedWork[],
  options: StandingOptions & { readonly halfPlateMm: number },
): StandingQuestion {
  const reachMm = reachRadius(armWithTool(arm, robot.tool)) * 1000;
  const at = work.map(({ point }) => itemToFloor(point.fixture, [point.xMm, point.yMm]));
  return {
    study: 'standing',
    mover: 'robot',
    ...askedOf(robot, options.wrist, work),
    drawn: { xMm: robot.xMm, yMm: robot.yMm, angleDeg: robot.angleDeg },
    footprintMm: squareMm(options.halfPlateMm).map(([x, y]): [number, number] => [x, y]),
    blocksMm: takenOutlines(items, robot.id, options.halfPlateMm),
    // No place from which every point is within reach lies farther from any of them than the arm reaches.
    grid: gridOver(items, commonBox(at, reachMm), [robot.xMm, robot.yMm], options.stepMm),
    turnsDeg: turnsFrom(robot.angleDeg, options.turns),
    risersMm: [...options.risersMm],
  };
}

/** Where could this fixture stand, with the robot where it is? `work`: the robot's points on this fixture. */
export function standingOfFixture(
  items: readonly Item[],
  fixture: Fixture,
  robot: Robot,
  arm: Arm,
  work: readonly NamedWork[],
  options: Omit<StandingOptions, 'risersMm'> & { readonly halfPlateMm: number },
): StandingQuestion {
  const reachMm = reachRadius(armWithTool(arm, robot.tool)) * 1000;
  const farthestMm = Math.max(0, ...work.map(({ point }) => Math.hypot(point.xMm, point.yMm)));
  const { xMm, yMm, angleDeg } = fixture;
  return {
    study: 'standing',
    mover: 'fixture',
    ...askedOf(robot, options.wrist, work),
    drawn: { xMm, yMm, angleDeg },
    footprintMm: fixture.outlineMm,
    blocksMm: takenOutlines(items, fixture.id, options.halfPlateMm),
    grid: gridOver(items, commonBox([[robot.xMm, robot.yMm]], reachMm + farthestMm), [xMm, yMm], options.stepMm),
    turnsDeg: turnsFrom(angleDeg, options.turns),
    risersMm: [robot.riserMm],
  };
}

export interface ToleranceOptions extends Pick<ToleranceQuestion, 'placeMm' | 'turnDeg' | 'levelDeg' | 'trials'> {
  readonly wrist: WristMode;
}

/** The same seed for everybody, so that the same question has one answer. */
const SEED = 1;

export function toleranceOfRobot(
  robot: Robot,
  work: readonly NamedWork[],
  options: ToleranceOptions,
): ToleranceQuestion {
  const { wrist, placeMm, turnDeg, levelDeg, trials } = options;
  return { study: 'tolerance', ...askedOf(robot, wrist, work), placeMm, turnDeg, levelDeg, trials, seed: SEED };
}

/** How far off is the tool, over all the floor that the robot reaches at the sheet's tool height and direction? */
export function errorGainOfRobot(
  robot: Robot,
  arm: Arm,
  settings: Pick<MapSettings, 'wrist' | 'toolHeightMm' | 'tiltDeg' | 'towards' | 'headingDeg' | 'rollDeg'>,
  options: Pick<ErrorGainQuestion, 'turnErrorDeg' | 'slideErrorMm'> & { readonly stepMm: number },
): ErrorGainQuestion {
  const { points: _, ...standing } = askedOf(robot, settings.wrist, []);
  const { toolHeightMm, tiltDeg, towards, headingDeg, rollDeg } = settings;
  const { stepMm, ...errors } = options;
  const cells = Math.ceil((reachRadius(armWithTool(arm, robot.tool)) * 1000) / stepMm);
  const grid = {
    originMm: [tidy(robot.xMm - cells * stepMm), tidy(robot.yMm - cells * stepMm)] as [number, number],
    stepMm,
    columns: 2 * cells + 1,
    rows: 2 * cells + 1,
  };
  return { study: 'errorGain', ...standing, toolHeightMm, tiltDeg, towards, headingDeg, rollDeg, ...errors, grid };
}

function turnsFrom(angleDeg: number, count: number): number[] {
  return Array.from({ length: count }, (_, index) => {
    const turn = angleDeg + (360 * index) / count;
    return Number((turn > 180 ? turn - 360 : turn).toFixed(6));
  });
}
