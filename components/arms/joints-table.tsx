import { DataCell, DataRow, DataTable, HeadCell } from '@/components/ui/data-table';
import { formatFigure } from '@/components/ui/figure';
import { VisuallyHidden } from '@/components/ui/visually-hidden';
import { JOINT_COLUMNS, shownPerStored, type JointColumn, type JointData } from './joint-columns';

const KIND_WORDS: Record<JointData['type'], string> = { revolute: 'turns', prismatic: 'slides' };

/** Whole numbers where they are whole: 450, but 12.5. */
function shown(joint: JointData, column: JointColumn): string {
  const value = Number((joint[column.field] * shownPerStored(column, joint.type)).toFixed(3));
  const decimals = String(Math.abs(value)).split('.')[1]?.length ?? 0;
  return formatFigure(value, { decimals });
}

/** The joints of an arm by Denavit-Hartenberg rows, with their limits. */
export function JointsTable({ joints }: { joints: readonly JointData[] }) {
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
            {JOINT_COLUMNS.map((column) => (
              <DataCell key={column.field} figures className="h-8!">
                {shown(joint, column)}
              </DataCell>
            ))}
          </DataRow>
        ))}
      </tbody>
    </DataTable>
  );
}
