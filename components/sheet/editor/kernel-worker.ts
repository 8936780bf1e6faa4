import { makeLiveMapper, type LiveMap, type LiveMapTask } from '@/lib/layout/live-map';
import { makeSectionMapper, type SectionTask, type SectionTile } from '@/lib/layout/section-cut';

/** The browser's own kernel, beside the page: one question in, one answer out. */
export type KernelTask =
  { readonly kind: 'map'; readonly task: LiveMapTask } | { readonly kind: 'section'; readonly task: SectionTask };

/** Null where the kernel refuses an arm or a question: the stored map says why. */
export interface KernelAnswer {
  readonly result: LiveMap | SectionTile | null;
}

const scope = self as unknown as {
  onmessage: ((event: MessageEvent<KernelTask>) => void) | null;
  postMessage: (answer: KernelAnswer, transfer: Transferable[]) => void;
};

const now = (): number => performance.now();
const mapOf = makeLiveMapper(now);
const sectionOf = makeSectionMapper(now);

function answer(asked: KernelTask): KernelAnswer {
  try {
    return { result: asked.kind === 'map' ? mapOf(asked.task) : sectionOf(asked.task) };
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    return { result: null };
  }
}

scope.onmessage = ({ data }) => {
  const told = answer(data);
  const planes = Object.values(told.result?.tile ?? {}).filter((plane): plane is Uint8Array<ArrayBuffer> =>
    ArrayBuffer.isView(plane),
  );
  scope.postMessage(
    told,
    planes.map(({ buffer }) => buffer),
  );
};
