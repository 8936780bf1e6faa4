'use client';

import { createContext, useContext, useSyncExternalStore, type ReactNode } from 'react';
import type { LibraryArm } from '@/lib/contracts/arms';
import { useMapSettings, useSheet, type LayoutOnBoard } from '@/lib/client/use-layout';
import type { SheetState } from '@/lib/editor/sheet';
import type { ViewStore } from './view-store';

/** A layout on the board and all that the panels round it share. Its identity holds while the layout stays open. */
export interface Board extends LayoutOnBoard {
  readonly projectId: string;
  /** The newest version of every arm in the library, by name. */
  readonly libraryArms: readonly LibraryArm[];
  /** False until the library has been asked for. */
  readonly isLibraryThere: boolean;
  /** Every arm that a robot of the sheet may name, older versions included. */
  readonly arms: ReadonlyMap<string, LibraryArm>;
  readonly view: ViewStore;
  /** Moves the keyboard to the first typed value of what is chosen. */
  readonly typeValues: () => void;
}

const BoardContext = createContext<Board | null>(null);

export function BoardProvider({ board, children }: { readonly board: Board; readonly children: ReactNode }) {
  return <BoardContext value={board}>{children}</BoardContext>;
}

export function useBoard(): Board {
  const board = useContext(BoardContext);
  if (!board) throw new Error('The panels of the sheet belong inside its board.');
  return board;
}

/** One field of the sheet's state; see useSheet. */
export function useBoardSheet<T>(select: (state: SheetState) => T): T {
  return useSheet(useBoard(), select);
}

export function useBoardSettings() {
  return useMapSettings(useBoard());
}

export function useView() {
  const { view } = useBoard();
  return useSyncExternalStore(view.subscribe, view.get, view.get);
}
