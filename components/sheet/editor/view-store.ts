import type { MapScale } from '@/lib/layout/scales';
import { fitBounds, screenToFloor, type FloorBounds, type Viewport } from '@/lib/layout/viewport';

export interface View {
  readonly viewport: Viewport;
  /** The canvas on the page, px; zero before it is measured. */
  readonly size: { readonly width: number; readonly height: number };
  /** Pixels at the lower edge that the map key covers. */
  readonly coveredPx: number;
  /** The colours of the map: a reader's own choice. */
  readonly mapScale: MapScale;
  /** The panel beside the sheet that is in front, by id; empty: the first on a wide page, none on a phone. */
  readonly side: string;
}

const EMPTY_FLOOR: FloorBounds = { minXMm: 0, minYMm: 0, maxXMm: 9000, maxYMm: 6000 };

/** What the canvas shows. Apart from the sheet: looking is not editing, and nobody else's business. */
export class ViewStore {
  private view: View = {
    viewport: { scale: 0.1, xMm: 0, yMm: 6000 },
    size: { width: 0, height: 0 },
    coveredPx: 0,
    mapScale: 'tide',
    side: '',
  };
  /** What was last fitted; undefined once somebody looks elsewhere. */
  private fitted: FloorBounds | null | undefined = undefined;
  private readonly listeners = new Set<() => void>();

  readonly get = (): View => this.view;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  set(change: Partial<Omit<View, 'viewport' | 'side'>>): void {
    this.change(change);
    // Until somebody looks elsewhere, the whole sheet stays in view while the page finds its sizes.
    if (this.fitted !== undefined) this.fit(this.fitted);
  }

  /** Brings a panel beside the sheet to the front. */
  readonly openSide = (side: string): void => {
    if (side !== this.view.side) this.change({ side });
  };

  /** Somebody moved the view. */
  look(viewport: Viewport): void {
    this.fitted = undefined;
    this.change({ viewport });
  }

  /** Shows the whole of `bounds` in the part of the canvas that nothing covers. */
  fit(bounds: FloorBounds | null): void {
    this.fitted = bounds;
    const { size, coveredPx } = this.view;
    if (size.width === 0) return;
    const free = { width: size.width, height: Math.max(size.height - coveredPx, 80) };
    const margin = Math.min(36, size.width / 14);
    this.change({ viewport: fitBounds(bounds ?? EMPTY_FLOOR, free, margin) });
  }

  private change(change: Partial<View>): void {
    this.view = { ...this.view, ...change };
    for (const listener of [...this.listeners]) listener();
  }

  /** The floor in the middle of what is seen. */
  middle(): { xMm: number; yMm: number } {
    const { viewport, size, coveredPx } = this.view;
    return screenToFloor(viewport, { x: size.width / 2, y: (size.height - coveredPx) / 2 });
  }
}
