import { screen, waitFor, within } from '@testing-library/react';
import { http, HttpResponse } from 'msw';
import { describe, expect, it, vi } from 'vitest';
import type { ShareLink } from '@/lib/contracts/share-links';
import { api, withApi } from '@/tests/components/api';
import { fakeId, fakeShareLink } from '@/tests/components/fakes';
import { show } from '@/tests/components/show';
import { ShareLinkDialog } from './share-link-dialog';

withApi();

const LIST = `/api/revisions/${fakeId(60)}/share-links`;
const ADDRESS = 'https://elbowroom.example/share/a-token-that-is-shown-once';

function keep(shareLinks: ShareLink[]): { asked: unknown[] } {
  const asked: unknown[] = [];
  api.use(
    http.get(LIST, () => HttpResponse.json({ shareLinks })),
    http.post(LIST, async ({ request }) => {
      const body = (await request.json()) as { label: string; mayRemark: boolean };
      asked.push(body);
      const link = fakeShareLink(80 + shareLinks.length, { label: body.label, mayRemark: body.mayRemark });
      shareLinks.push(link);
      return HttpResponse.json({ ...link, url: ADDRESS }, { status: 201 });
    }),
    http.delete('/api/share-links/:shareLinkId', ({ params }) => {
      const index = shareLinks.findIndex((link) => link.id === params.shareLinkId);
      shareLinks[index] = { ...shareLinks[index], revokedAt: new Date().toISOString() };
      return HttpResponse.json(shareLinks[index]);
    }),
  );
  return { asked };
}

const dialog = <ShareLinkDialog revisionId={fakeId(60)} revisionName="B, rev 7" onClose={vi.fn()} />;

describe('ShareLinkDialog', () => {
  it('makes a link as asked, shows its address once and copies it', async () => {
    const { asked } = keep([]);
    const { user, unmount } = show(dialog, 'integrator');
    expect(await screen.findByText('None yet.')).toBeVisible();
    await user.type(screen.getByLabelText('For whom'), 'Vera, Quillfen');
    await user.clear(screen.getByLabelText('Works for'));
    await user.type(screen.getByLabelText('Works for'), '14');
    await user.click(screen.getByRole('checkbox', { name: 'May pin remarks' }));
    await user.click(screen.getByRole('button', { name: 'Make a link' }));

    expect(await screen.findByLabelText('Address')).toHaveValue(ADDRESS);
    expect(asked).toEqual([{ label: 'Vera, Quillfen', mayRemark: false, maySign: false, expiresInDays: 14 }]);
    await user.click(screen.getByRole('button', { name: 'Copy the address' }));
    expect(await screen.findByRole('button', { name: 'Copied' })).toBeVisible();
    expect(await navigator.clipboard.readText()).toBe(ADDRESS);
    expect(await screen.findByText('Vera, Quillfen')).toBeVisible();

    unmount();
    show(dialog, 'integrator');
    expect(await screen.findByText('Vera, Quillfen')).toBeVisible();
    expect(screen.queryByDisplayValue(ADDRESS)).toBeNull();
  });

  it('refuses a term that is no number, beside the field, and keeps the rest', async () => {
    const { asked } = keep([]);
    const { user } = show(dialog, 'integrator');
    await user.type(await screen.findByLabelText('For whom'), 'Vera');
    await user.clear(screen.getByLabelText('Works for'));
    await user.click(screen.getByRole('button', { name: 'Make a link' }));
    await waitFor(() => expect(screen.getByLabelText('Works for')).toBeInvalid());
    expect(screen.getByLabelText('For whom')).toHaveValue('Vera');
    expect(asked).toHaveLength(0);
  });

  it('asks before it revokes, and then says that the link is revoked', async () => {
    keep([fakeShareLink(80, { label: 'Vera, Quillfen', openCount: 3, lastOpenedAt: new Date().toISOString() })]);
    const { user } = show(dialog, 'integrator');
    await user.click(await screen.findByRole('button', { name: 'Revoke Vera, Quillfen' }));
    const question = within(await screen.findByRole('dialog', { name: 'Revoke this link?' }));
    expect(question.getByText(/stops working at once/)).toBeVisible();
    await user.click(question.getByRole('button', { name: 'Revoke link' }));
    expect(await screen.findByText('Revoked')).toBeVisible();
    expect(screen.queryByRole('button', { name: 'Revoke Vera, Quillfen' })).toBeNull();
  });
});
