import { Moment } from '@/components/ui/moment';
import { Panel } from '@/components/ui/panel';
import { Tag } from '@/components/ui/tag';
import type { SignOff } from '@/lib/contracts/sign-offs';

/** Who has accepted or asked for changes, newest first. */
export function SignOffList({ signOffs }: { readonly signOffs: readonly SignOff[] }) {
  if (signOffs.length === 0) return null;
  return (
    <Panel title="Signed" className="border-x-0 border-t-0">
      <ul>
        {[...signOffs].reverse().map(({ id, decision, name, email, note, sha256, signedAt }) => (
          <li key={id} className="border-t border-hair px-3.5 py-2 first:border-t-0">
            <p className="flex flex-wrap items-center gap-x-2 gap-y-0.5">
              <Tag tone={decision === 'accepted' ? 'roomy' : 'tight'}>
                {decision === 'accepted' ? 'Accepted' : 'Changes asked for'}
              </Tag>
              <span>
                {name}
                {email && <span className="text-ink-soft">, {email}</span>}
              </span>
              <span className="text-sm text-ink-soft">
                <Moment iso={signedAt} />
              </span>
            </p>
            {note && <p className="mt-1 whitespace-pre-wrap">{note}</p>}
            <p className="text-sm text-ink-soft">
              SHA-256{' '}
              <abbr title={sha256} className="font-mono no-underline">
                {sha256.slice(0, 12)}…
              </abbr>
            </p>
          </li>
        ))}
      </ul>
    </Panel>
  );
}
