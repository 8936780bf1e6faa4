import { composeFloorMap, floorGridOf, type FloorMap, type PlacedMap } from '@/lib/layout/floor-map';
import type { MapMeasure } from '@/lib/layout/map-settings';

/**
 * Composes the floor map again and again while bases are dragged. Three results are kept in turn and written over, so that
 * dragging allocates next to nothing and the picture on screen is never the one being written.
 */
export class FloorComposer {
  private readonly results: (FloorMap | undefined)[] = [undefined, undefined, undefined];
  private turn = 0;

  compose(maps: readonly PlacedMap[], stepMm: number, measure: MapMeasure): FloorMap | null {
    const grid = floorGridOf(maps, stepMm);
    if (!grid) return null;
    this.turn = (this.turn + 1) % this.results.length;
    const result = composeFloorMap(grid, maps, measure, this.results[this.turn]);
    this.results[this.turn] = result;
    return result;
  }
}
