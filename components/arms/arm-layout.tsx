import type { ReactNode } from 'react';
import { Page } from '@/components/ui/page';
import { Panel } from '@/components/ui/panel';
import { SectionDrawing } from './section-drawing';
import type { ArmStudy } from './use-arm-study';

interface ArmLayoutProps {
  study: ArmStudy;
  /** Whether the chain can be drawn as it stands. */
  isWhole?: boolean;
  name: string;
  /** Over both columns. */
  notice?: ReactNode;
  /** Under the drawing. */
  aside?: ReactNode;
  children: ReactNode;
}

/** The page of an arm: the table and what is said of it at the left, the drawing at the right. */
export function ArmLayout({ study, isWhole = true, name, notice, aside, children }: ArmLayoutProps) {
  return (
    <Page className="grid items-start gap-4 lg:grid-cols-[minmax(0,1fr)_29rem]">
      {notice && <div className="min-w-0 lg:col-span-2">{notice}</div>}
      <div className="min-w-0">{children}</div>
      <div className="min-w-0">
        <Panel title="Section through the first axis" aside="tool down, wrist held" padded>
          <SectionDrawing study={study} isAwaited={isWhole} name={name} />
        </Panel>
        {aside}
      </div>
    </Page>
  );
}
