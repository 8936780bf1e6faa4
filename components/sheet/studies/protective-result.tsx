'use client';

import { useUnits } from '@/lib/client/use-units';
import type { ProtectiveDistance } from '@/lib/layout/protective/protective-distance';

/** A protective distance with everything that it adds up from; or how many figures it waits for. */
export function ProtectiveResult({ answer }: { readonly answer: ProtectiveDistance }) {
  const { unit, figure } = useUnits();
  if (!answer.told) {
    const count = answer.questions.length;
    return (
      <p className="mt-2 text-sm text-red" role="status" data-protective="asks">
        No distance yet: {count === 1 ? 'one figure is' : `${count} figures are`} missing. Nothing is assumed in its
        place.
      </p>
    );
  }
  return (
    <div className="mt-2 text-sm" role="status" data-protective={Math.ceil(answer.distanceMm - 1e-6)}>
      <p className="text-[0.9375rem] font-semibold">
        S = <span className="font-mono">{figure(Math.ceil(answer.distanceMm - 1e-6))}</span> {unit}
      </p>
      <ul>
        {answer.terms.map(({ words, valueMm }) => (
          <li key={words} className="flex justify-between gap-3">
            <span>{words}</span>
            <span className="font-mono whitespace-nowrap tabular-nums">
              {figure(valueMm)} {unit}
            </span>
          </li>
        ))}
      </ul>
      <p className="mt-1 text-[0.8125rem] leading-4.5 text-ink-soft">
        {answer.source}. {answer.open.join(' ')}
      </p>
    </div>
  );
}
