'use client';

import { ImagePlus, X } from 'lucide-react';
import { useRef } from 'react';
import { Button } from '@/components/ui/button';

interface PictureChoiceProps {
  readonly picture: File | null;
  readonly onChoose: (picture: File | null) => void;
  readonly label?: string;
  readonly busy?: boolean;
}

/** One picture from the disk or, on a phone, from the camera. */
export function PictureChoice({ picture, onChoose, label = 'Attach a picture', busy = false }: PictureChoiceProps) {
  const input = useRef<HTMLInputElement>(null);
  return (
    <>
      <input
        ref={input}
        type="file"
        accept="image/png,image/jpeg,image/webp"
        className="sr-only"
        aria-label={label}
        tabIndex={-1}
        onChange={(event) => {
          onChoose(event.target.files?.[0] ?? null);
          event.target.value = '';
        }}
      />
      {picture ? (
        <span className="flex min-w-0 items-center gap-1 text-sm">
          <span className="truncate">{picture.name}</span>
          <Button variant="quiet" size="icon" aria-label="Leave the picture out" onClick={() => onChoose(null)}>
            <X aria-hidden className="size-4" />
          </Button>
        </span>
      ) : (
        <Button size="small" busy={busy} onClick={() => input.current?.click()}>
          <ImagePlus aria-hidden className="size-4" />
          {label}
        </Button>
      )}
    </>
  );
}
