'use client';

import { useSyncExternalStore } from 'react';
import { z } from 'zod';
import { keptChoice } from './kept-choice';

const share = z.number().min(0).max(1).catch(1);
const layersSchema = z.object({ plan: share, map: share, linework: share }).catch({ plan: 1, map: 1, linework: 1 });

/** How strongly each layer of a sheet is drawn, 0 to 1. */
export type Layers = z.infer<typeof layersSchema>;
export type LayerName = keyof Layers;

const ALL: Layers = { plan: 1, map: 1, linework: 1 };

function parse(text: string | null): Layers {
  if (text === null) return ALL;
  try {
    return layersSchema.parse(JSON.parse(text));
  } catch {
    return ALL;
  }
}

const choice = keptChoice<Layers>('elbowroom-layers', parse);
const onServer = (): Layers => ALL;

/** A reader's own way of looking at sheets; nobody else sees it. */
export function useLayers(): Layers {
  return useSyncExternalStore(choice.subscribe, choice.read, onServer);
}

export function setLayer(name: LayerName, value: number): void {
  choice.choose({ ...choice.read(), [name]: Math.min(1, Math.max(0, value)) });
}
