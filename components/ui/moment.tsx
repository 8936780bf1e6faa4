'use client';

const DAY_MS = 24 * 3600 * 1000;

const clock = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit' });
const day = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric' });
const full = new Intl.DateTimeFormat('en-GB', { dateStyle: 'full', timeStyle: 'short' });

const startOfDay = (date: Date): number => new Date(date.getFullYear(), date.getMonth(), date.getDate()).getTime();

/** A moment as people say it: today 14:05, yesterday, tomorrow, 12 Mar 2026. */
export function sayMoment(date: Date, now = new Date()): string {
  const days = Math.round((startOfDay(date) - startOfDay(now)) / DAY_MS);
  if (days === 0) return `today ${clock.format(date)}`;
  if (days === -1) return 'yesterday';
  if (days === 1) return 'tomorrow';
  return day.format(date);
}

/** A moment in words, the full date on hover. For data fetched in the browser: the words depend on its clock. */
export function Moment({ iso, className }: { iso: string; className?: string }) {
  const date = new Date(iso);
  return (
    <time dateTime={iso} title={full.format(date)} className={className}>
      {sayMoment(date)}
    </time>
  );
}
