/** A robot as its URDF file tells it: links held together by joints, a tree. Metres, radians. */

export type UrdfMotion = 'revolute' | 'continuous' | 'prismatic' | 'fixed';

export interface UrdfJoint {
  readonly name: string;
  readonly motion: UrdfMotion | 'floating' | 'planar';
  readonly parent: string;
  readonly child: string;
  /** Where the joint stands in its parent link. */
  readonly xyz: readonly [number, number, number];
  readonly rpy: readonly [number, number, number];
  /** Unit vector in the joint's own frame. */
  readonly axis: readonly [number, number, number];
  /** NaN for what the file does not say. */
  readonly lower: number;
  readonly upper: number;
  readonly velocity: number;
  /** The joint that this one follows. */
  readonly mimics: string | null;
}

export interface UrdfModel {
  readonly name: string;
  readonly links: readonly string[];
  readonly joints: readonly UrdfJoint[];
  /** The one link that hangs on no joint. */
  readonly root: string;
  /** How many angles were written as rounded right angles and are taken as exact. */
  readonly squaredAngles: number;
}

/** Joints from one link down to another, in order. The tree has been checked: it ends. Null where `to` does not hang on `from`. */
export function pathBetween(model: UrdfModel, from: string, to: string): UrdfJoint[] | null {
  const above = new Map(model.joints.map((joint) => [joint.child, joint]));
  const path: UrdfJoint[] = [];
  for (let link = to; link !== from;) {
    const joint = above.get(link);
    if (!joint) return null;
    path.unshift(joint);
    link = joint.parent;
  }
  return path;
}

export const moves = ({ motion }: UrdfJoint): boolean => motion !== 'fixed';

/** Links that can stand for the tip of a chain from `base`: ends of branches first, the one with most moving joints before all. */
export function tipsOf(
  model: UrdfModel,
  base: string,
): { readonly link: string; readonly moving: number; readonly isEnd: boolean }[] {
  const parents = new Set(model.joints.map(({ parent }) => parent));
  return model.links
    .flatMap((link) => {
      const moving = pathBetween(model, base, link)?.filter(moves).length ?? 0;
      return moving > 0 ? [{ link, moving, isEnd: !parents.has(link) }] : [];
    })
    .sort((one, other) => Number(other.isEnd) - Number(one.isEnd) || other.moving - one.moving);
}
