'use client';

import { createContext, useContext, useMemo, type ReactNode } from 'react';

interface TitleBlockSurroundings {
  /** Where the mark leads; null where it leads nowhere (a customer on a share link). */
  homeHref: string | null;
  /** Stands at the right end of every title block, for example the account menu. */
  account: ReactNode;
}

const Surroundings = createContext<TitleBlockSurroundings>({ homeHref: null, account: null });

/** Gives every title block below it the same home and the same account menu. */
export function TitleBlockProvider({ homeHref, account, children }: TitleBlockSurroundings & { children: ReactNode }) {
  const value = useMemo(() => ({ homeHref, account }), [homeHref, account]);
  return <Surroundings value={value}>{children}</Surroundings>;
}

export const useTitleBlockSurroundings = (): TitleBlockSurroundings => useContext(Surroundings);
