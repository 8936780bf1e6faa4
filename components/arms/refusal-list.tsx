import type { Refusal } from '@/lib/layout/arm-import/imported-arm';

/** Enough to see what is wrong; the same fault in every row need not fill the page. */
const SHOWN = 12;

/** Why a file is not taken, with the places in it. */
export function RefusalList({ refusals }: { refusals: readonly Refusal[] }) {
  return (
    <div role="alert">
      {refusals.length > 0 && (
        <ul className="border-t border-red px-3.5 py-2.5 font-medium text-red">
          {refusals.slice(0, SHOWN).map(({ where, message }) => (
            <li key={`${where} ${message}`} className="py-0.5">
              {where && <span>{where}. </span>}
              {message}
            </li>
          ))}
          {refusals.length > SHOWN && <li className="py-0.5">And {refusals.length - SHOWN} more.</li>}
        </ul>
      )}
    </div>
  );
}
