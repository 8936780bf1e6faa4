import type { Metadata, Viewport } from 'next';
import { cookies, headers } from 'next/headers';
import type { ReactNode } from 'react';
import '@fontsource/barlow-semi-condensed/400.css';
import '@fontsource/barlow-semi-condensed/500.css';
import '@fontsource/barlow-semi-condensed/600.css';
import '@fontsource/sometype-mono/400.css';
import '@fontsource/sometype-mono/500.css';
import '@fontsource/sometype-mono/600.css';
import './globals.css';
import { BOARD_COOKIE, boardScript, isBoard } from '@/components/ui/board';
import { UnitsProvider } from '@/components/shell/units-provider';
import { Toaster } from '@/components/ui/toaster';
import { TooltipProvider } from '@/components/ui/tooltip';
import { DataProvider } from '@/lib/client/data-provider';

export const metadata: Metadata = {
  title: { default: 'Elbowroom', template: '%s · Elbowroom' },
  description:
    'Plan a robot workcell on a real floor and see how evenly and how fast every arm can move, spot by spot.',
  robots: { index: false },
};

export const viewport: Viewport = {
  width: 'device-width',
  initialScale: 1,
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: '#faf8f2' },
    { media: '(prefers-color-scheme: dark)', color: '#14202d' },
  ],
};

export default async function RootLayout({ children }: { children: ReactNode }) {
  const kept = (await cookies()).get(BOARD_COOKIE)?.value;
  const board = isBoard(kept) ? kept : undefined;
  // proxy.ts makes it anew for each page; without it the browser refuses to run a script of ours.
  const nonce = (await headers()).get('x-nonce') ?? undefined;
  return (
    // The script below may set data-board before React wakes up; that difference is meant.
    <html lang="en" data-board={board} suppressHydrationWarning>
      <head>
        {board ? null : (
          // Browsers hide a nonce once it has served, which React would take for a difference.
          <script nonce={nonce} suppressHydrationWarning dangerouslySetInnerHTML={{ __html: boardScript }} />
        )}
      </head>
      <body>
        <DataProvider>
          <UnitsProvider>
            <TooltipProvider>{children}</TooltipProvider>
          </UnitsProvider>
        </DataProvider>
        <Toaster />
      </body>
    </html>
  );
}
