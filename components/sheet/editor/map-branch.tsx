'use client';

import { useMemo } from 'react';
import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import { branchNames } from '@/lib/kinematics/maps/compute-tile';
import { useBoard, useBoardSettings } from './board-context';
import { useFloor } from './floor-context';
import { useSettingChange } from './use-setting-change';

const BEST = 'best';

/** The best branch a spot, or one class of those that the sheet's arms have. */
export function MapBranch() {
  const { arms } = useBoard();
  const { robots } = useFloor();
  const { branch } = useBoardSettings();
  const change = useSettingChange();
  const byRobot = useMemo(
    () =>
      robots.map(({ name, armId }) => {
        const arm = arms.get(armId);
        return { name, branches: arm ? branchNames(arm.definition) : [] };
      }),
    [robots, arms],
  );
  const names = [...new Set([...byRobot.flatMap(({ branches }) => branches), ...(branch === BEST ? [] : [branch])])];
  const lacking = branch === BEST ? [] : byRobot.filter(({ branches }) => !branches.includes(branch));
  if (names.length === 0) return null;
  return (
    <Field
      label="Posture of the arm"
      className="col-span-2"
      hint={
        lacking.length > 0
          ? `${lacking.map(({ name }) => name).join(', ')}: no such posture, so the best one is mapped.`
          : undefined
      }
    >
      <Select
        value={branch}
        onValueChange={(value) => change({ branch: value }, '')}
        options={[{ value: BEST, label: 'The best at each spot' }, ...names.map((value) => ({ value, label: value }))]}
      />
    </Field>
  );
}
