import { Panel } from '@/components/ui/panel';
import { TABLE_EXAMPLE } from '@/lib/layout/arm-import/table-example';

/** What files are taken. */
export function FormatHelp() {
  return (
    <Panel title="What is read">
      <div className="flex flex-col gap-2 p-3.5">
        <p>
          <strong className="font-semibold">CSV.</strong> A header that names each column with its unit, then one line a
          joint from the base to the tool. Commas, semicolons or tabs between columns; a point or a comma for decimals.
          mm or m, deg or rad.
        </p>
        <pre tabIndex={0} className="overflow-x-auto border border-hair p-2 font-mono text-xs leading-5">
          {TABLE_EXAMPLE}
        </pre>
        <p>
          Lines that begin with # may give name, payload, convention, base, tool, coupling and actuators; exporting an
          arm shows how.
        </p>
        <p>
          <strong className="font-semibold">URDF.</strong> Joints, limits and speeds of the chain between two links you
          choose. It is written in DH rows and checked against the file in several postures. Shapes and masses are
          passed over.
        </p>
        <p className="text-ink-soft">
          What a file does not say is left empty and asked for. Nothing is filled in silently.
        </p>
      </div>
    </Panel>
  );
}
