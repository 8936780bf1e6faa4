'use client';

import { BookmarkPlus } from 'lucide-react';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import type { Fixture } from '@/lib/layout/items';
import { SaveFixtureDialog } from './save-fixture-dialog';

export function SaveFixtureButton({ fixture }: { readonly fixture: Fixture }) {
  const [isOpen, setOpen] = useState(false);
  return (
    <>
      <Button variant="quiet" size="small" className="mt-2 -ml-2.5" onClick={() => setOpen(true)}>
        <BookmarkPlus aria-hidden className="size-4" /> Save to the library
      </Button>
      {isOpen && <SaveFixtureDialog fixture={fixture} onClose={() => setOpen(false)} />}
    </>
  );
}
