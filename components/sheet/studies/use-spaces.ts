'use client';

import { useEffect, useMemo, useState } from 'react';
import type { Robot } from '@/lib/layout/items';
import { wayPostures } from '@/lib/layout/clearance/robot-clearance';
import { convexOverlap, overlapAreaM2 } from '@/lib/layout/spaces/overlap';
import { maximumSpace, operatingSpace, restrictedSearch, type Space } from '@/lib/layout/spaces/spaces';
import type { PointMm } from '@/lib/layout/geometry';
import { useStudySubjects, type Subject } from './use-study-subjects';

export interface RobotSpaces {
  readonly robot: Robot;
  readonly spaces: readonly Space[];
  /** The restricted space is still being searched for. */
  readonly isSearching: boolean;
}

/** Floor that both of two robots can come to. */
export interface Overlap {
  readonly names: string;
  readonly outlineMm: readonly PointMm[];
  readonly areaM2: number;
}

export interface Spaces {
  readonly robots: readonly RobotSpaces[];
  readonly overlaps: readonly Overlap[];
}

/** The spaces of every robot, and the floor that two of them share. */
export function useSpaces(): Spaces {
  const { robots, working } = useStudySubjects();
  const restricted = useRestricted(robots);
  const found = useMemo(
    () =>
      robots.map(({ robot, arm }): RobotSpaces => {
        const limited = restricted.get(robot.id) ?? null;
        const postures = wayPostures(working.find((entry) => entry.robot.id === robot.id));
        const spaces = [
          maximumSpace(robot, arm.definition, arm.reachMm),
          limited,
          operatingSpace(robot, arm.definition, arm.reachMm, postures),
        ];
        return { robot, spaces: spaces.filter((space) => space !== null), isSearching: limited === null };
      }),
    [robots, working, restricted],
  );
  const overlaps = useMemo(
    () =>
      found.flatMap((one, index) =>
        found.slice(index + 1).flatMap((other): Overlap[] => {
          const outlineMm = convexOverlap(zoneOf(one), zoneOf(other));
          const areaM2 = overlapAreaM2(outlineMm);
          return areaM2 === 0 ? [] : [{ names: `${one.robot.name} and ${other.robot.name}`, outlineMm, areaM2 }];
        }),
      ),
    [found],
  );
  return { robots: found, overlaps };
}

/** Where a robot may come to: as limiting devices leave it, else by design. */
function zoneOf({ spaces }: RobotSpaces): readonly PointMm[] {
  return (spaces.find(({ kind }) => kind === 'restricted') ?? spaces[0]).outlineMm;
}

type Search = ReturnType<typeof restrictedSearch>;

/** Several panels look at the same spaces: each search is made once, and goes on from wherever it is looked at. */
const searches = new Map<string, Search>();
const KEPT_SEARCHES = 60;

function searchFor({ robot, arm }: Subject): Search {
  const { xMm, yMm, angleDeg, tool, part, jointStops } = robot;
  const key = JSON.stringify([arm.id, xMm, yMm, angleDeg, tool, part?.radiusMm ?? 0, jointStops]);
  const known = searches.get(key);
  if (known) return known;
  const made = restrictedSearch(robot, arm.definition, arm.reachMm);
  searches.set(key, made);
  if (searches.size > KEPT_SEARCHES) searches.delete(searches.keys().next().value!);
  return made;
}

/** Searches direction by direction, so that the page stays quick under the hand. */
function useRestricted(subjects: readonly Subject[]): ReadonlyMap<string, Space> {
  const [found, setFound] = useState<ReadonlyMap<string, Space>>(new Map());
  useEffect(() => {
    const done = new Map<string, Space>();
    let timer: ReturnType<typeof setTimeout>;
    const goOn = () => {
      const open = subjects.find(({ robot }) => !done.has(robot.id));
      if (!open) return setFound(done);
      const space = searchFor(open).next();
      if (space) done.set(open.robot.id, space);
      timer = setTimeout(goOn, 0);
    };
    timer = setTimeout(goOn, 0);
    return () => clearTimeout(timer);
  }, [subjects]);
  return found;
}
