'use client';

import { useEffect } from 'react';

type Input = 'pointer' | 'keyboard';
let last: Input = 'pointer';

function note(event: Event): void {
  last = event.type === 'keydown' ? 'keyboard' : 'pointer';
}

/**
 * Whether the last thing used was the keyboard. A command given by keyboard must not end with something that only a pointer can
 * finish: placing then puts the thing into the middle of the view.
 */
export function useLastInput(): () => Input {
  useEffect(() => {
    window.addEventListener('keydown', note, true);
    window.addEventListener('pointerdown', note, true);
    return () => {
      window.removeEventListener('keydown', note, true);
      window.removeEventListener('pointerdown', note, true);
    };
  }, []);
  return readLast;
}

const readLast = (): Input => last;
