import { XMLParser, XMLValidator } from 'fast-xml-parser';
import { answering, demandSize, refuse, type Imported } from './imported-arm';
import { readTriple, squareAngles } from './urdf-numbers';
import type { UrdfJoint, UrdfModel } from './urdf-model';

/**
 * Reads a URDF file (Unified Robot Description Format, an open XML format). Only names, joints and limits are looked at; shapes,
 * masses and everything else are passed over. No document type, so no entities of the file's own; nothing is fetched.
 */

const MOST_LINKS = 500;
const MOST_NESTED = 40;
const MOTIONS = ['revolute', 'continuous', 'prismatic', 'fixed', 'floating', 'planar'] as const;

type Element = Readonly<Record<string, unknown>>;

export function readUrdf(text: string): Imported<UrdfModel> {
  return answering(() => {
    demandSize(text);
    const robot = robotOf(text);
    const name = attribute(robot, 'name') ?? '';
    const links = elements(robot, 'link').map((link) => attribute(link, 'name') ?? refuse('A link has no name.'));
    if (links.length > MOST_LINKS) refuse(`The file has ${links.length} links; up to ${MOST_LINKS} are taken.`);
    const squared = { count: 0 };
    const joints = elements(robot, 'joint').map((joint) => readJoint(joint, squared));
    demandTree(links, joints);
    const hanging = new Set(joints.map(({ child }) => child));
    const root =
      links.find((link) => !hanging.has(link)) ?? refuse('The links go round in a circle: none is the first.');
    return { name, links, joints, root, squaredAngles: squared.count };
  });
}

function robotOf(text: string): Element {
  const bare = text.replace(/<!--[\s\S]*?-->/g, '');
  if (/<!(DOCTYPE|ENTITY)/i.test(bare))
    refuse('The file declares a document type. A plain URDF file has none: take that line out.');
  if (/<xacro:|\$\{/.test(bare))
    refuse('This is a xacro source with parts still to be filled in. Expand it to plain URDF first.');
  const valid = XMLValidator.validate(text);
  if (valid !== true) refuse(`The file is no well-formed XML: ${valid.err.msg}`, `Line ${valid.err.line}`);
  const parser = new XMLParser({
    ignoreAttributes: false,
    attributeNamePrefix: '@',
    parseAttributeValue: false,
    parseTagValue: false,
    maxNestedTags: MOST_NESTED,
    isArray: (tag) => tag === 'link' || tag === 'joint',
  });
  let parsed: unknown;
  try {
    parsed = parser.parse(text);
  } catch (error) {
    refuse(`The file cannot be read as XML: ${error instanceof Error ? error.message : 'unknown fault'}`);
  }
  return child(parsed as Element, 'robot') ?? refuse('The file has no <robot>: it is no URDF.');
}

function readJoint(joint: Element, squared: { count: number }): UrdfJoint {
  const name = attribute(joint, 'name') ?? refuse('A joint has no name.');
  const where = `Joint ${name}`;
  const word = attribute(joint, 'type') ?? '';
  const motion = MOTIONS.find((each) => each === word) ?? refuse(`“${word}” is no type of joint.`, where);
  const end = (tag: 'parent' | 'child'): string =>
    attribute(child(joint, tag), 'link') ?? refuse(`The <${tag} link="…"> is missing.`, where);
  const origin = child(joint, 'origin');
  const limit = child(joint, 'limit');
  const figure = (key: string): number => {
    const text = attribute(limit, key);
    return text === undefined ? NaN : readTriple(`${text} 0 0`, `${where}, limit ${key}`)[0];
  };
  const rpy = squareAngles(attribute(origin, 'rpy') ?? '0 0 0', `${where}, origin rpy`);
  squared.count += rpy.squared;
  return {
    name,
    motion,
    parent: end('parent'),
    child: end('child'),
    xyz: readTriple(attribute(origin, 'xyz') ?? '0 0 0', `${where}, origin xyz`),
    rpy: rpy.angles,
    axis: unit(
      readTriple(attribute(child(joint, 'axis'), 'xyz') ?? '1 0 0', `${where}, axis xyz`),
      `${where}, axis xyz`,
    ),
    lower: figure('lower'),
    upper: figure('upper'),
    velocity: figure('velocity'),
    mimics: attribute(child(joint, 'mimic'), 'joint') ?? null,
  };
}

function unit([x, y, z]: [number, number, number], where: string): [number, number, number] {
  const size = Math.hypot(x, y, z);
  if (!(size > 1e-6)) refuse('An axis needs a direction.', where);
  return [x / size, y / size, z / size];
}

/** Every link once, every joint between two known links, no link on two joints, no circles. */
function demandTree(links: readonly string[], joints: readonly UrdfJoint[]): void {
  if (links.length === 0) refuse('The file has no links.');
  if (joints.length === 0) refuse('The file has no joints.');
  const known = new Set(links);
  if (known.size !== links.length) refuse('Two links have the same name.');
  if (new Set(joints.map(({ name }) => name)).size !== joints.length) refuse('Two joints have the same name.');
  const above = new Map<string, UrdfJoint>();
  for (const joint of joints) {
    for (const link of [joint.parent, joint.child])
      if (!known.has(link)) refuse(`It names the link “${link}”, which is not in the file.`, `Joint ${joint.name}`);
    const other = above.get(joint.child);
    if (other)
      refuse(
        `The link “${joint.child}” hangs on two joints, ${other.name} and ${joint.name}: closed loops are not taken.`,
      );
    above.set(joint.child, joint);
  }
  for (const link of links) {
    let at: string | undefined = link;
    for (let steps = 0; at !== undefined; steps++) {
      if (steps > links.length) refuse('The links go round in a circle.', `Link ${link}`);
      at = above.get(at)?.parent;
    }
  }
  const roots = links.filter((link) => !above.has(link));
  if (roots.length > 1)
    refuse(
      `The links ${roots
        .slice(0, 5)
        .map((link) => `“${link}”`)
        .join(', ')} hang on no joint: a robot is one tree.`,
    );
}

function elements(parent: Element, tag: string): Element[] {
  const found = parent[tag];
  return (Array.isArray(found) ? found : []).map((each) => (isElement(each) ? each : {}));
}

function child(parent: Element | undefined, tag: string): Element | undefined {
  const found = parent && Object.hasOwn(parent, tag) ? parent[tag] : undefined;
  const first: unknown = Array.isArray(found) ? found[0] : found;
  return isElement(first) ? first : undefined;
}

function attribute(parent: Element | undefined, name: string): string | undefined {
  const key = `@${name}`;
  const found = parent && Object.hasOwn(parent, key) ? parent[key] : undefined;
  return typeof found === 'string' && found.trim() !== '' ? found.trim() : undefined;
}

const isElement = (value: unknown): value is Element =>
  typeof value === 'object' && value !== null && !Array.isArray(value);
