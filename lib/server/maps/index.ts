export { askMap } from './ask-map';
export { cancelMap } from './cancel-map';
export { findMap } from './data';
export { finishedMapFor } from './finished-map-for';
export { presentMap } from './present';
export { readMapTiles } from './read-tiles';
export { retryMap } from './retry-map';
export { tilesResponse } from './tiles-response';
