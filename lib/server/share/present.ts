import type { ShareLink as ShareLinkAnswer } from '@/lib/contracts/share-links';
import type { ShareLink } from '@/models';

export function presentShareLink(link: ShareLink): ShareLinkAnswer {
  return {
    id: link.id,
    revisionId: link.revisionId,
    label: link.label,
    mayRemark: link.mayRemark,
    maySign: link.maySign,
    expiresAt: link.expiresAt.toISOString(),
    revokedAt: link.revokedAt?.toISOString() ?? null,
    lastOpenedAt: link.lastOpenedAt?.toISOString() ?? null,
    openCount: link.openCount,
    createdAt: link.createdAt.toISOString(),
    opens: (link.opens ?? []).map(({ createdAt, guestName, guestEmail, device }) => ({
      openedAt: createdAt.toISOString(),
      who: guestName && guestEmail ? `${guestName}, ${guestEmail}` : null,
      device,
    })),
  };
}
