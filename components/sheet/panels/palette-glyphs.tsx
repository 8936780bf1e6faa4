import type { ReactNode } from 'react';
import type { ToolName } from '@/lib/editor/tools/tool';

/** The palette's small drawings: each shows its thing as the sheet draws it. */
const GLYPHS: Partial<Record<ToolName, ReactNode>> = {
  select: <path d="M6 3.5 17.5 13l-5.3.6-2.9 4.6z" fill="var(--sheet)" />,
  robot: (
    <>
      <circle cx="7.5" cy="15" r="4.2" />
      <circle cx="7.5" cy="15" r="1.2" />
      <path d="m8.5 13.6 7-7.4" strokeWidth="1.8" />
      <circle cx="16.6" cy="5.2" r="1.9" fill="var(--sheet)" />
    </>
  ),
  fixture: <path d="M2.5 5.5h17v11h-17zM2.5 5.5l17 11M19.5 5.5l-17 11" />,
  obstacle: <path d="M4.5 4.5h13v13h-13z" fill="var(--hair)" stroke="var(--ink-soft)" />,
  guardLine: (
    <path d="M3 4.5h16v13H3z" stroke="var(--red)" strokeWidth="1.9" strokeDasharray="0.1 3.2" strokeLinecap="round" />
  ),
  column: (
    <>
      <path d="M5.5 5.5h11v11h-11z" fill="var(--hair)" stroke="var(--ink-soft)" />
      <path d="m5.5 11 5.5 5.5M5.5 6l10.5 10.5M11 5.5 16.5 11" stroke="var(--ink-soft)" strokeWidth="0.9" />
    </>
  ),
  conveyor: (
    <>
      <path d="M2.5 7.5h17v7h-17z" />
      <path d="M6 7.5v7M9.5 7.5v7M13 7.5v7M16.5 7.5v7" strokeWidth="0.8" />
    </>
  ),
  zone: (
    <>
      <path d="M3.5 5.5h15v11h-15z" strokeDasharray="3 1.6" />
      <path d="m4 16 5-10M9 16l5-10M14 16l4-8" strokeWidth="0.8" />
    </>
  ),
  protectiveDevice: (
    <>
      <path d="M4 9.6h14M4 12.4h14" stroke="var(--red)" />
      <path d="M2.5 8.5h3v5h-3zM16.5 8.5h3v5h-3z" fill="var(--red)" stroke="none" />
    </>
  ),
  note: <path d="M4 5.5h14M4 9.5h14M4 13.5h9" />,
  sectionLine: (
    <>
      <path d="M3.5 13.5h4M14.5 13.5h4" strokeWidth="2.2" />
      <path d="M9 13.5h1.2M11.8 13.5H13M3.5 13.5V8M18.5 13.5V8" />
      <path d="m3.5 5.5 1.7 3H1.8zM18.5 5.5l1.7 3h-3.4z" fill="currentColor" stroke="none" />
    </>
  ),
  walkway: <path d="M2 6.5h18M2 15.5h18" stroke="var(--ink-soft)" strokeDasharray="6 1.8 1 1.8" />,
  taskPoint: <path d="m11 4.8 5.6 6.2-5.6 6.2L5.4 11z" fill="var(--green)" stroke="none" />,
  dimension: (
    <>
      <path d="M2.5 4.5v13M19.5 4.5v13M4 11h14" />
      <path d="m7.4 9-3.6 2 3.6 2zM14.6 9l3.6 2-3.6 2z" fill="currentColor" stroke="none" />
    </>
  ),
  plumb: (
    <>
      <path d="M11 2.5v9" />
      <path d="M8.2 11.5h5.6L11 19.5z" fill="var(--red)" stroke="var(--red)" />
    </>
  ),
};

export function Glyph({ tool }: { readonly tool: ToolName }) {
  return (
    <svg viewBox="0 0 22 22" width="22" height="22" fill="none" stroke="currentColor" strokeWidth="1.4" aria-hidden>
      {GLYPHS[tool]}
    </svg>
  );
}
