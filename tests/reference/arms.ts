import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import { RIGHT_ANGLE as RIGHT, sliding, turning } from '@/lib/kinematics/testing/chains';
import type { Arm, Frame, Freedom } from '@/lib/kinematics/types';

/** The arms that the reference data covers: every built-in one, and chains of other kinds (invented lengths and speeds). */
export interface ReferenceArm {
  readonly name: string;
  readonly arm: Arm;
  /** What the chain controls, thought out by hand rather than taken from the kernel. */
  readonly freedoms: readonly Freedom[];
}

const ALL: readonly Freedom[] = ['x', 'y', 'z', 'rx', 'ry', 'rz'];
const TILTED_BASE: Frame = { xyz: [0.3, -0.2, 0.5], rpy: [0.2, -0.3, 0.4] };
const CROOKED_TOOL: Frame = { xyz: [0.06, 0.03, 0.12], rpy: [0.5, -0.4, 0.3] };

const SEVEN_JOINTS = [
  turning({ a: 0, alpha: -RIGHT, d: 0.34 }),
  turning({ a: 0, alpha: RIGHT, d: 0 }),
  turning({ a: 0, alpha: RIGHT, d: 0.4 }, 2.5),
  turning({ a: 0, alpha: -RIGHT, d: 0 }, 2.6),
  turning({ a: 0, alpha: -RIGHT, d: 0.4 }, 3),
  turning({ a: 0, alpha: RIGHT, d: 0 }, 3.1),
  turning({ a: 0, alpha: 0, d: 0.12 }, 3.4),
];

const CRAIG_SIX_JOINTS = [
  turning({ a: 0, alpha: 0, d: 0.4 }),
  turning({ a: 0.1, alpha: -RIGHT, d: 0 }, 2, 0.3),
  turning({ a: 0.6, alpha: 0, d: 0 }),
  turning({ a: 0.1, alpha: -RIGHT, d: 0.5 }, 3, -0.2),
  turning({ a: 0, alpha: RIGHT, d: 0 }, 4),
  turning({ a: 0, alpha: -RIGHT, d: 0.1 }, 5),
];

export const OTHER_CHAINS: readonly ReferenceArm[] = [
  {
    name: 'seven axes, tilted base, crooked tool',
    arm: { convention: 'standard', joints: SEVEN_JOINTS, base: TILTED_BASE, tool: CROOKED_TOOL },
    freedoms: ALL,
  },
  {
    name: 'six axes in Craig’s rows, tilted base, crooked tool',
    arm: { convention: 'modified', joints: CRAIG_SIX_JOINTS, base: TILTED_BASE, tool: CROOKED_TOOL },
    freedoms: ALL,
  },
  {
    name: 'six axes on a track, in Craig’s rows',
    arm: {
      convention: 'modified',
      joints: [
        sliding({ a: 0, alpha: RIGHT, d: 0 }),
        { ...CRAIG_SIX_JOINTS[0], alpha: -RIGHT },
        ...CRAIG_SIX_JOINTS.slice(1),
      ],
      tool: CROOKED_TOOL,
    },
    freedoms: ALL,
  },
  {
    name: 'planar, three turns, point alone',
    arm: {
      convention: 'standard',
      joints: [
        turning({ a: 0.5, alpha: 0, d: 0 }),
        turning({ a: 0.4, alpha: 0, d: 0 }, 3),
        turning({ a: 0.2, alpha: 0, d: 0 }, 5),
      ],
      freedoms: ['x', 'y'],
    },
    freedoms: ['x', 'y'],
  },
  {
    name: 'planar, three turns',
    arm: {
      convention: 'standard',
      joints: [
        turning({ a: 0.5, alpha: 0, d: 0 }),
        turning({ a: 0.4, alpha: 0, d: 0 }, 3),
        turning({ a: 0.2, alpha: 0, d: 0 }, 5),
      ],
    },
    freedoms: ['x', 'y', 'rz'],
  },
  {
    name: 'coupled parallelogram, tool kept upright',
    arm: {
      convention: 'standard',
      joints: [
        turning({ a: 0.2, alpha: -RIGHT, d: 0.6 }),
        turning({ a: 0.8, alpha: 0, d: 0 }),
        turning({ a: 0.7, alpha: 0, d: 0 }),
        turning({ a: 0.1, alpha: -RIGHT, d: 0 }),
        turning({ a: 0, alpha: 0, d: 0.2 }),
      ],
      coupling: [
        [1, 0, 0, 0],
        [0, 1, 0, 0],
        [0, -1, 1, 0],
        [0, 0, -1, 0],
        [0, 0, 0, 1],
      ],
      actuators: [1.8, 1.7, 1.9, 5].map((maxSpeed) => ({ min: -2, max: 2, maxSpeed, maxAcceleration: 5 })),
    },
    freedoms: ['x', 'y', 'z', 'rz'],
  },
];

const freedomsOf = (arm: Arm): readonly Freedom[] =>
  (arm.actuators ?? arm.joints).length === 4 ? ['x', 'y', 'z', 'rz'] : ALL;

export const BUILT_IN: readonly ReferenceArm[] = BUILT_IN_ARMS.map(({ name, arm }) => ({
  name,
  arm,
  freedoms: freedomsOf(arm),
}));

export const REFERENCE_ARMS: readonly ReferenceArm[] = [...BUILT_IN, ...OTHER_CHAINS];
