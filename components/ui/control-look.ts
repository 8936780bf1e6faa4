/** The look of everything one types or picks in. */
export const CONTROL_LOOK =
  'min-h-9 w-full min-w-0 rounded border border-ink-soft bg-sheet px-2.5 text-[0.9375rem] text-ink pointer-coarse:min-h-11 pointer-coarse:text-base ' +
  'hover:border-ink focus-visible:border-petrol focus-visible:outline-offset-0 disabled:opacity-50 aria-invalid:border-red';
