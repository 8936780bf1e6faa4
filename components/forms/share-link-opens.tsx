import { Moment } from '@/components/ui/moment';
import type { ShareLink } from '@/lib/contracts/share-links';

const DEVICES: Record<ShareLink['opens'][number]['device'], string> = {
  phone: 'on a phone',
  tablet: 'on a tablet',
  computer: 'on a computer',
  program: 'by a program, such as a mail scanner',
};

/** Who opened a link and when, as far as that is known: a guest is known once they have written or signed. */
export function ShareLinkOpens({ link }: { readonly link: ShareLink }) {
  if (link.opens.length === 0) return null;
  return (
    <details className="text-sm">
      <summary className="cursor-pointer text-petrol underline pointer-coarse:py-2">Who opened it</summary>
      <ul className="mt-1 text-ink-soft">
        {link.opens.map(({ openedAt, who, device }, index) => (
          <li key={`${openedAt} ${index}`}>
            <Moment iso={openedAt} />, {who ?? 'somebody'} {DEVICES[device]}
          </li>
        ))}
      </ul>
      {link.openCount > link.opens.length && (
        <p className="text-ink-soft">and {link.openCount - link.opens.length} times before that</p>
      )}
    </details>
  );
}
