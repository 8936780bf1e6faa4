'use client';

import { Checkbox } from '@/components/ui/checkbox';
import { LoadingLine } from '@/components/ui/loading-line';
import { Notice } from '@/components/ui/notice';
import { useProjects } from '@/lib/client/use-projects';

interface ProjectPickerProps {
  chosen: readonly string[];
  onChange: (projectIds: string[]) => void;
  error?: string;
}

/** Ticks the projects that a viewer may look at. */
export function ProjectPicker({ chosen, onChange, error }: ProjectPickerProps) {
  const { data, error: fault } = useProjects();
  const toggle = (id: string, isOn: boolean): void =>
    onChange(isOn ? [...chosen, id] : chosen.filter((one) => one !== id));
  return (
    <fieldset className="min-w-0">
      <legend className="text-sm text-ink-soft">Projects this person may look at</legend>
      <div className="mt-1 max-h-60 overflow-y-auto border border-ink-soft px-2.5 py-1">
        {!data && !fault && <LoadingLine label="Loading the projects" />}
        {fault && <Notice tone="trouble">{fault.message}</Notice>}
        {data?.projects.length === 0 && <p className="py-1 text-ink-soft">There is no project yet.</p>}
        {data?.projects.map((project) => (
          <Checkbox
            key={project.id}
            checked={chosen.includes(project.id)}
            onCheckedChange={(isOn) => toggle(project.id, isOn)}
            label={project.customerName ? `${project.name}, ${project.customerName}` : project.name}
          />
        ))}
      </div>
      <p role="alert" className="text-sm font-medium text-red">
        {error}
      </p>
    </fieldset>
  );
}
