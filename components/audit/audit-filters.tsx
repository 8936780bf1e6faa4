import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import { TextInput } from '@/components/ui/text-input';
import type { AuditFilter } from '@/lib/contracts/audit';
import { actionWords } from './action-words';

interface AuditFiltersProps {
  readonly filter: AuditFilter;
  readonly actions: readonly string[];
  readonly onChange: (filter: AuditFilter) => void;
}

/** A select has no empty value. */
const ANY = 'any';

/** Who, what, which subject, from when to when. */
export function AuditFilters({ filter, actions, onChange }: AuditFiltersProps) {
  const set = (change: Partial<AuditFilter>) => onChange({ ...filter, ...change });
  return (
    <form
      role="search"
      aria-label="Filter the audit"
      className="grid gap-3 border-b border-rule px-3.5 py-3 sm:grid-cols-2 lg:grid-cols-[1.4fr_1.4fr_1fr_1fr]"
      onSubmit={(event) => event.preventDefault()}
    >
      <Field label="Who">
        <TextInput
          type="search"
          value={filter.who}
          placeholder="Name or e-mail"
          onChange={(event) => set({ who: event.target.value })}
        />
      </Field>
      <Field label="What">
        <Select
          value={filter.action || ANY}
          onValueChange={(action) => set({ action: action === ANY ? '' : action })}
          options={[
            { value: ANY, label: 'Everything' },
            ...actions.map((action) => ({ value: action, label: actionWords(action) })),
          ]}
        />
      </Field>
      <Field label="From">
        <TextInput type="date" value={filter.from} onChange={(event) => set({ from: event.target.value })} />
      </Field>
      <Field label="To">
        <TextInput type="date" value={filter.to} onChange={(event) => set({ to: event.target.value })} />
      </Field>
      {filter.subjectId && (
        <p className="flex flex-wrap items-center gap-2 text-sm sm:col-span-2 lg:col-span-4">
          Only what concerns <span className="font-mono">{filter.subjectId}</span>
          <Button size="small" variant="quiet" onClick={() => set({ subjectId: '' })}>
            Show all subjects
          </Button>
        </p>
      )}
    </form>
  );
}
