import { classNames } from './class-names';

/** The mark: a small arm and the arc of its movement. */
export function Mark({ className }: { className?: string }) {
  return (
    <svg
      viewBox="0 0 32 32"
      fill="none"
      stroke="currentColor"
      strokeLinecap="round"
      aria-hidden
      className={classNames('text-petrol', className)}
    >
      <path d="M4.5 27.5 12.4 14.6M16.4 13.8 27 18" strokeWidth="3.2" />
      <circle cx="14" cy="11.8" r="3.1" strokeWidth="2.9" />
      <path d="M20.8 4a12.6 12.6 0 0 1 7 7.4" strokeWidth="1.9" />
    </svg>
  );
}

/** The mark with the name beside it. */
export function Wordmark({ className }: { className?: string }) {
  return (
    <span className={classNames('inline-flex items-center gap-3 text-ink', className)}>
      <Mark className="size-7 shrink-0" />
      <span className="text-[1.3rem] leading-none font-medium">Elbowroom</span>
    </span>
  );
}
