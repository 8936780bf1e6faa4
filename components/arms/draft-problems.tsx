import type { DraftProblem } from '@/lib/editor/arm/check';
import { PROBLEMS_ID } from './draft-cell-input';
import { focusCell } from './focus-cell';

/** What is wrong with the draft, a sentence each; pressing one leads to its cell. */
export function DraftProblems({ problems }: { problems: readonly DraftProblem[] }) {
  return (
    <div id={PROBLEMS_ID} role="status">
      {problems.length > 0 && (
        <ul className="border-t border-red py-1.5 font-medium text-red">
          {problems.map(({ message, paths }) => (
            <li key={`${paths[0]} ${message}`}>
              <button
                type="button"
                onClick={() => focusCell(document, paths[0])}
                className="block min-h-7 w-full px-3.5 py-1 text-left hover:underline focus-visible:-outline-offset-2 pointer-coarse:min-h-11"
              >
                {message}
              </button>
            </li>
          ))}
        </ul>
      )}
    </div>
  );
}
