import { useId, type ReactNode } from 'react';

/** One study or one kind of distance, ruled off from the next. */
export function Section({ title, children }: { readonly title: string; readonly children: ReactNode }) {
  const id = useId();
  return (
    <section aria-labelledby={id} className="border-b border-rule px-3.5 pt-3 pb-3.5">
      <h2 id={id} className="mb-1.5 text-[0.9375rem] font-semibold">
        {title}
      </h2>
      {children}
    </section>
  );
}

export function Quiet({ children }: { readonly children: ReactNode }) {
  return <p className="text-[0.8125rem] leading-4.5 text-ink-soft">{children}</p>;
}
