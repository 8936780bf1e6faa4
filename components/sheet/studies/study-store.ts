import { useSyncExternalStore } from 'react';
import { useBoard } from '@/components/sheet/editor/board-context';
import type { NamedWork } from '@/lib/layout/standing/ask';
import type { ErrorGainQuestion, StandingQuestion, ToleranceQuestion } from '@/lib/layout/standing/question';
import type { SpaceKind } from '@/lib/layout/spaces/spaces';

/** A study that was asked from this sheet, and what it was asked about. */
export interface AskedStudy<Question> {
  readonly studyId: string;
  readonly question: Question;
  readonly work: readonly NamedWork[];
  readonly robotId: string;
  /** What is moved: the robot itself, or a fixture. */
  readonly moverId: string;
}

/** What the sheet shows of studies and spaces: looking is not editing, so it is not saved. */
export interface StudyView {
  readonly standing: AskedStudy<StandingQuestion> | null;
  readonly errorGain: AskedStudy<ErrorGainQuestion> | null;
  /** The study that lies on the floor in place of the dexterity map. */
  readonly shown: 'standing' | 'errorGain' | null;
  readonly tolerance: AskedStudy<ToleranceQuestion> | null;
  readonly spaces: ReadonlySet<SpaceKind>;
  readonly showsOverlap: boolean;
}

const NOTHING: StudyView = {
  standing: null,
  errorGain: null,
  shown: null,
  tolerance: null,
  spaces: new Set(),
  showsOverlap: false,
};

class StudyStore {
  private view = NOTHING;
  private readonly listeners = new Set<() => void>();

  readonly get = (): StudyView => this.view;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  set(change: Partial<StudyView>): void {
    this.view = { ...this.view, ...change };
    for (const listener of [...this.listeners]) listener();
  }
}

/** One a sheet, so that panels and canvas share it without the board knowing of studies. */
const stores = new WeakMap<object, StudyStore>();

export function useStudyStore(): StudyStore {
  const { sheet } = useBoard();
  const known = stores.get(sheet);
  if (known) return known;
  const made = new StudyStore();
  stores.set(sheet, made);
  return made;
}

export function useStudyView(): StudyView {
  const store = useStudyStore();
  return useSyncExternalStore(store.subscribe, store.get, store.get);
}
