import { DataCell, DataRow, DataTable, HeadCell } from '@/components/ui/data-table';
import { VisuallyHidden } from '@/components/ui/visually-hidden';
import type { ArmDefinition } from '@/lib/contracts/arm';
import { JOINT_COLUMNS, KIND_WORDS, shownText } from '@/lib/layout/arm-columns';

/** The joints of an arm by Denavit-Hartenberg rows, with their limits. */
export function JointsTable({ joints }: { joints: ArmDefinition['joints'] }) {
  return (
    <DataTable caption="Joints, from the base to the tool">
      <thead>
        <tr>
          <HeadCell>
            <VisuallyHidden>Joint</VisuallyHidden>
          </HeadCell>
          <HeadCell>Kind</HeadCell>
          {JOINT_COLUMNS.map((column) => (
            <HeadCell
              key={column.field}
              figures
              abbr={column.name}
              className={column.label.length < 2 ? 'font-mono' : ''}
            >
              {column.label}
            </HeadCell>
          ))}
        </tr>
      </thead>
      <tbody>
        {joints.map((joint, index) => (
          <DataRow key={index}>
            <th scope="row" className="h-8 pl-3.5 text-left font-semibold">
              J{index + 1}
            </th>
            <DataCell className="h-8!">{KIND_WORDS[joint.type]}</DataCell>
            {JOINT_COLUMNS.map(({ field, quantity }) => (
              <DataCell key={field} figures className="h-8!">
                {shownText(joint[field], quantity, joint.type)}
              </DataCell>
            ))}
          </DataRow>
        ))}
      </tbody>
    </DataTable>
  );
}
