'use client';

import { DataRow, DataTable, HeadCell } from '@/components/ui/data-table';
import { VisuallyHidden } from '@/components/ui/visually-hidden';
import type { DraftProblem } from '@/lib/editor/arm/check';
import type { ArmDraft } from '@/lib/editor/arm/draft';
import { setCell } from '@/lib/editor/arm/edits';
import { TRAVEL_COLUMNS } from '@/lib/layout/arm-columns';
import { DraftCellInput } from './draft-cell-input';
import { invalidFields, type ChangeDraft } from './draft-table';

interface CouplingTablesProps {
  draft: ArmDraft;
  problems: readonly DraftProblem[];
  onChange: ChangeDraft;
}

/** Of an arm whose joints are coupled: how much each actuator turns each joint, and what the actuators may do. */
export function CouplingTables({ draft, problems, onChange }: CouplingTablesProps) {
  const { coupling, actuators } = draft;
  const setText = (path: string, text: string): void => onChange((old) => setCell(old, path, text));
  if (!coupling) return null;
  return (
    <>
      <h3 className="border-t border-rule px-3.5 py-2 font-semibold">
        Coupling <span className="font-normal text-ink-soft">joint travel a unit of actuator travel</span>
      </h3>
      <DataTable caption="Coupling: joints by actuators" className="w-auto!">
        <thead>
          <tr>
            <HeadCell>
              <VisuallyHidden>Joint</VisuallyHidden>
            </HeadCell>
            {coupling[0]?.map((_, actuator) => (
              <HeadCell key={actuator} figures className="px-2!">
                A{actuator + 1}
              </HeadCell>
            ))}
          </tr>
        </thead>
        <tbody>
          {coupling.map((row, joint) => (
            <DataRow key={joint}>
              <th scope="row" className="h-8 px-3.5 text-left font-semibold">
                J{joint + 1}
              </th>
              {row.map((cell, actuator) => (
                <td key={actuator} className="w-20">
                  <DraftCellInput
                    path={`coupling.${joint}.${actuator}`}
                    label={`Joint ${joint + 1} a unit of actuator ${actuator + 1}`}
                    cell={cell}
                    invalid={invalidFields(problems, `coupling.${joint}.`).split(' ').includes(String(actuator))}
                    onText={setText}
                  />
                </td>
              ))}
            </DataRow>
          ))}
        </tbody>
      </DataTable>
      {actuators && (
        <DataTable caption="Actuators" className="w-auto! border-t border-rule">
          <thead>
            <tr>
              <HeadCell>
                <VisuallyHidden>Actuator</VisuallyHidden>
              </HeadCell>
              {TRAVEL_COLUMNS.map(({ field, label }) => (
                <HeadCell key={field} figures className="px-2!">
                  {label}
                </HeadCell>
              ))}
            </tr>
          </thead>
          <tbody>
            {actuators.map((actuator, index) => (
              <DataRow key={index}>
                <th scope="row" className="h-8 px-3.5 text-left font-semibold">
                  A{index + 1}
                </th>
                {TRAVEL_COLUMNS.map(({ field, name }) => (
                  <td key={field} className="w-20">
                    <DraftCellInput
                      path={`actuators.${index}.${field}`}
                      label={`Actuator ${index + 1}, ${name}`}
                      cell={actuator[field]}
                      invalid={invalidFields(problems, `actuators.${index}.`).split(' ').includes(field)}
                      onText={setText}
                    />
                  </td>
                ))}
              </DataRow>
            ))}
          </tbody>
        </DataTable>
      )}
    </>
  );
}
