'use client';

import { Layers2 } from 'lucide-react';
import { Popover } from 'radix-ui';
import { buttonLook } from '@/components/ui/button-look';
import { Slider } from '@/components/ui/slider';
import { setLayer, useLayers, type LayerName } from '@/lib/client/use-layers';

const LAYERS: readonly { readonly name: LayerName; readonly words: string }[] = [
  { name: 'linework', words: 'Linework' },
  { name: 'plan', words: 'Floor plan' },
  { name: 'map', words: 'Map' },
];

/** How strongly plan, map and linework are drawn, for this reader alone. */
export function LayersChoice() {
  const layers = useLayers();
  return (
    <Popover.Root>
      <Popover.Trigger className={buttonLook('quiet', 'small', 'px-2')}>
        <Layers2 aria-hidden className="size-4" />
        Layers
      </Popover.Trigger>
      <Popover.Portal>
        <Popover.Content
          align="start"
          sideOffset={4}
          collisionPadding={8}
          aria-label="Layers"
          className="z-40 w-64 max-w-[94vw] border border-rule bg-sheet p-3.5 text-ink focus-visible:outline-none"
        >
          {LAYERS.map(({ name, words }) => {
            const percent = Math.round(layers[name] * 100);
            return (
              <div key={name} className="grid grid-cols-[5rem_1fr_3rem] items-center gap-2 text-sm">
                <span aria-hidden>{words}</span>
                <Slider
                  label={`${words}, strength`}
                  value={percent}
                  onValueChange={(next) => setLayer(name, next / 100)}
                />
                <span aria-hidden className="text-right font-mono">
                  {percent} %
                </span>
              </div>
            );
          })}
          <p className="mt-1 text-[0.8125rem] leading-4 text-ink-soft">Only you see this; prints are drawn in full.</p>
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
}
