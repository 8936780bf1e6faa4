import { makeLiveMapper, type LiveMap, type LiveMapTask } from '@/lib/layout/live-map';

/** The browser's own kernel, beside the page: one question in, one answer out. */
export type KernelAnswer = { readonly kind: 'map'; readonly map: LiveMap } | { readonly kind: 'refused' };

const scope = self as unknown as {
  onmessage: ((event: MessageEvent<LiveMapTask>) => void) | null;
  postMessage: (answer: KernelAnswer, transfer: Transferable[]) => void;
};

const compute = makeLiveMapper(() => performance.now());

scope.onmessage = ({ data }) => {
  try {
    const map = compute(data);
    const planes = Object.values(map.tile).filter((plane): plane is Uint8Array<ArrayBuffer> =>
      ArrayBuffer.isView(plane),
    );
    scope.postMessage(
      { kind: 'map', map },
      planes.map(({ buffer }) => buffer),
    );
  } catch (error) {
    // An arm or a question that the kernel refuses: the stored map says why.
    if (!(error instanceof RangeError)) throw error;
    scope.postMessage({ kind: 'refused' }, []);
  }
};
