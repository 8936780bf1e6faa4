'use client';

import { useState } from 'react';
import { sayError } from '@/lib/client/fetcher';
import type { Review } from '@/lib/client/use-review';
import { REMARK_PICTURES_MAX, type Remark } from '@/lib/contracts/remarks';
import { PictureChoice } from './picture-choice';

interface RemarkPicturesProps {
  readonly remark: Remark;
  readonly review: Review;
}

/** The pictures of a remark; its author can add to them. */
export function RemarkPictures({ remark, review }: RemarkPicturesProps) {
  const [busy, setBusy] = useState(false);
  const [fault, setFault] = useState<string | null>(null);
  const { id, number, pictures, author } = remark;
  const attach = async (file: File | null) => {
    if (!file) return;
    setBusy(true);
    setFault(null);
    try {
      await review.attach(id, file);
    } catch (error) {
      setFault(sayError(error));
    } finally {
      setBusy(false);
    }
  };
  const mayAdd = author.you && pictures.length < REMARK_PICTURES_MAX;
  if (pictures.length === 0 && !mayAdd) return null;
  return (
    <div className="grid gap-2">
      {pictures.length > 0 && (
        <ul className="flex flex-wrap gap-2">
          {pictures.map((picture, index) => (
            <li key={picture.id}>
              <a
                href={review.pictureUrl(id, picture.id)}
                target="_blank"
                rel="noreferrer"
                aria-label={`Picture ${index + 1} of remark ${number}, full size`}
              >
                {/* The picture's address is a key or needs the session: no optimiser may fetch it. */}
                {/* eslint-disable-next-line @next/next/no-img-element -- the picture comes from a route behind the session or the link */}
                <img
                  src={review.pictureUrl(id, picture.id)}
                  alt={`Picture ${index + 1} of remark ${number}`}
                  width={picture.widthPx}
                  height={picture.heightPx}
                  loading="lazy"
                  className="h-24 w-auto max-w-full border border-hair object-contain"
                />
              </a>
            </li>
          ))}
        </ul>
      )}
      {mayAdd && (
        <div>
          <PictureChoice picture={null} busy={busy} onChoose={(file) => void attach(file)} />
        </div>
      )}
      {fault && (
        <p role="alert" className="text-sm text-red">
          {fault}
        </p>
      )}
    </div>
  );
}
