import type { FloorPlan } from '@/lib/contracts/floor-plans';
import type { Project } from '@/lib/contracts/projects';
import type { Remark } from '@/lib/contracts/remarks';
import type { ShareLink } from '@/lib/contracts/share-links';

export const fakeId = (number: number): string => `00000000-0000-4000-8000-${String(number).padStart(12, '0')}`;

const DAY_MS = 24 * 3600 * 1000;
const fromToday = (days: number): string => new Date(Date.now() + days * DAY_MS).toISOString();

export function fakeProject(number: number, part: Partial<Project> = {}): Project {
  return {
    id: fakeId(number),
    name: `Project ${number}`,
    customerName: 'Quillfen Pumps',
    siteName: '',
    archivedAt: null,
    createdAt: fromToday(-30),
    updatedAt: fromToday(-number),
    layoutCount: 0,
    openRemarkCount: 0,
    ...part,
  };
}

export function fakeFloorPlan(number: number, part: Partial<FloorPlan> = {}): FloorPlan {
  return {
    id: fakeId(number),
    projectId: fakeId(1),
    name: `Plan ${number}.png`,
    widthPx: 2560,
    heightPx: 1880,
    pictureWidths: [1024, 2560],
    calibration: null,
    createdAt: fromToday(-1),
    ...part,
  };
}

export function fakeShareLink(number: number, part: Partial<ShareLink> = {}): ShareLink {
  return {
    id: fakeId(number),
    revisionId: fakeId(60),
    label: '',
    mayRemark: true,
    maySign: false,
    expiresAt: fromToday(30),
    revokedAt: null,
    lastOpenedAt: null,
    openCount: 0,
    opens: [],
    createdAt: fromToday(0),
    ...part,
  };
}

/** An open remark of a customer on revision 2. */
export function fakeRemark(number: number, part: Partial<Remark> = {}): Remark {
  return {
    id: fakeId(number),
    revisionId: fakeId(10),
    revisionNumber: 2,
    layoutId: fakeId(11),
    layoutTitle: 'C · R2 turned in',
    number,
    xMm: 0,
    yMm: 0,
    itemId: null,
    author: { name: 'Petra Quillfen', side: 'customer', you: false },
    body: 'Our maintenance cart needs 900 mm here.',
    resolvedAt: null,
    assignee: null,
    dueOn: null,
    mentions: [],
    pictures: [],
    unread: false,
    createdAt: '2026-12-01T09:00:00.000Z',
    replies: [],
    ...part,
  };
}
