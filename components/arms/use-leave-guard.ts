'use client';

import { useRouter } from 'next/navigation';
import { useEffect, useState } from 'react';

interface LeaveGuard {
  /** Where somebody is about to go; null while nobody is. */
  readonly href: string | null;
  readonly stay: () => void;
  readonly leave: () => void;
}

/** Asks before a link or a closed window takes unsaved edits away. */
export function useLeaveGuard(isChanged: boolean): LeaveGuard {
  const router = useRouter();
  const [href, setHref] = useState<string | null>(null);
  useEffect(() => {
    if (!isChanged) return;
    const ask = (event: BeforeUnloadEvent): void => event.preventDefault();
    const hold = (event: MouseEvent): void => {
      const link = event.target instanceof Element ? event.target.closest('a[href]') : null;
      const isPlain = event.button === 0 && !event.metaKey && !event.ctrlKey && !event.shiftKey && !event.altKey;
      if (!(link instanceof HTMLAnchorElement) || !isPlain || link.target === '_blank' || link.download) return;
      if (link.origin !== location.origin || link.pathname === location.pathname) return;
      event.preventDefault();
      event.stopPropagation();
      setHref(link.pathname + link.search);
    };
    window.addEventListener('beforeunload', ask);
    // On its way down to the link, before the router hears of it.
    window.addEventListener('click', hold, { capture: true });
    return () => {
      window.removeEventListener('beforeunload', ask);
      window.removeEventListener('click', hold, { capture: true });
    };
  }, [isChanged]);
  return {
    href,
    stay: () => setHref(null),
    leave: () => {
      if (href) router.push(href);
      setHref(null);
    },
  };
}
