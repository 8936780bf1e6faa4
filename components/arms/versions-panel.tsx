'use client';

import { useState } from 'react';
import { DataPart } from '@/components/ui/data-part';
import { DataCell, DataRow, DataTable } from '@/components/ui/data-table';
import { TextLink } from '@/components/ui/link-button';
import { Moment } from '@/components/ui/moment';
import { Panel } from '@/components/ui/panel';
import { Select } from '@/components/ui/select';
import { useArmVersions } from '@/lib/client/use-arms';
import type { LibraryArm } from '@/lib/contracts/arms';
import { armDifferences } from '@/lib/layout/arm-differences';

/** All versions of an arm, and what differs between two of them in words. */
export function VersionsPanel({ arm }: { arm: LibraryArm }) {
  const answer = useArmVersions(arm.id);
  return (
    <Panel title="Versions" className="mt-4">
      <DataPart answer={answer} loading="Loading the versions">
        {({ arms }) => (
          <>
            <DataTable caption="Versions, newest first">
              <tbody>
                {arms.map((version, index) => (
                  <DataRow key={version.id} className={index === 0 ? 'border-t-0' : undefined}>
                    <DataCell className="whitespace-nowrap">
                      {version.id === arm.id ? (
                        <strong className="font-semibold">Version {version.version}</strong>
                      ) : (
                        <TextLink href={`/arms/${version.id}`}>Version {version.version}</TextLink>
                      )}
                    </DataCell>
                    <DataCell className="text-ink-soft">
                      <Moment iso={version.createdAt} />
                    </DataCell>
                    <DataCell className="text-right whitespace-nowrap text-ink-soft">
                      {version.layoutCount === 1 ? '1 layout' : `${version.layoutCount} layouts`}
                    </DataCell>
                  </DataRow>
                ))}
              </tbody>
            </DataTable>
            {arms.length > 1 && <VersionDifferences arms={arms} shown={arm} />}
          </>
        )}
      </DataPart>
    </Panel>
  );
}

function VersionDifferences({ arms, shown }: { arms: readonly LibraryArm[]; shown: LibraryArm }) {
  const [right, setRight] = useState(String(shown.version > 1 ? shown.version : 2));
  const [left, setLeft] = useState(String(Number(right) - 1));
  const find = (version: string) => arms.find((arm) => String(arm.version) === version);
  const [older, newer] = [find(left), find(right)];
  const options = arms.map(({ version }) => ({ value: String(version), label: `Version ${version}` }));
  return (
    <div className="border-t border-rule p-3.5">
      <div className="flex items-center gap-2">
        <Select aria-label="Compare from" value={left} onValueChange={setLeft} options={options} />
        <span aria-hidden>→</span>
        <Select aria-label="Compare to" value={right} onValueChange={setRight} options={options} />
      </div>
      {older && newer && <DifferenceList lines={armDifferences(older, newer)} />}
    </div>
  );
}

/** What changed, a line each. */
export function DifferenceList({ lines }: { lines: readonly string[] }) {
  if (lines.length === 0) return <p className="mt-2.5 text-ink-soft">Nothing differs.</p>;
  return (
    <ul className="mt-2.5 flex flex-col gap-0.5">
      {lines.map((line) => (
        <li key={line}>{line}</li>
      ))}
    </ul>
  );
}
