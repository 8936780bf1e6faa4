import { describe, expect, it } from 'vitest';
import { fakeRemark } from '@/tests/components/fakes';
import { filteredRemarks, isOverdue } from './remark-filter';

const resolvedAt = '2026-12-02T08:00:00.000Z';
const me = '00000000-0000-4000-8000-000000000001';
const remarks = [
  fakeRemark(1, { number: 1, resolvedAt }),
  fakeRemark(2, { number: 2, unread: true }),
  fakeRemark(3, { number: 3, assignee: { id: me, name: 'Pia' }, dueOn: '2026-12-24' }),
];
const numbers = (...rest: [Parameters<typeof filteredRemarks>[1], string | null]) =>
  filteredRemarks(remarks, ...rest).map(({ number }) => number);

describe('a filter of remarks', () => {
  it('lets through what its name says, open ones first and the newest above', () => {
    expect(numbers('all', me)).toEqual([3, 2, 1]);
    expect(numbers('open', me)).toEqual([3, 2]);
    expect(numbers('unread', me)).toEqual([2]);
    expect(numbers('mine', me)).toEqual([3]);
    expect(numbers('settled', me)).toEqual([1]);
  });

  it('gives a guest, who has no account, nothing of their own', () => {
    expect(numbers('mine', null)).toEqual([]);
  });
});

describe('a day', () => {
  it('has passed on the day after it, and never for what is settled', () => {
    expect(isOverdue(remarks[2], '2026-12-24')).toBe(false);
    expect(isOverdue(remarks[2], '2026-12-25')).toBe(true);
    expect(isOverdue({ ...remarks[2], resolvedAt }, '2026-12-25')).toBe(false);
  });
});
