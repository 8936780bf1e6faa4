import { Figure } from '@/components/ui/figure';
import type { Calibration } from '@/lib/layout/calibration';

/** From here on the scale is said to be off: a robot at the far end of a 9 m bay would stand 45 mm wrong. */
const DOUBTFUL_ERROR = 0.005;

/** What the picked points come to, as they are picked. */
export function CalibrationResult({ result }: { result: Calibration | null }) {
  const check = result?.check;
  const error = result?.checkError ?? null;
  const isDoubtful = error !== null && Math.abs(error) > DOUBTFUL_ERROR;
  return (
    <section aria-label="Result" aria-live="polite" className="border-b border-rule px-3.5 py-3">
      <h2 className="pb-1 font-semibold">Result</h2>
      <dl className="grid grid-cols-[minmax(0,1fr)_auto] gap-x-4 gap-y-1 [&>dd]:text-right">
        <dt>Scale</dt>
        <dd data-testid="scale">
          <Figure value={result?.mmPerPx} decimals={4} unit="mm/px" />
        </dd>
        <dt>Error of the check</dt>
        <dd
          data-testid="check-error"
          className={isDoubtful ? 'font-semibold text-red' : error !== null ? 'text-green' : undefined}
        >
          <Figure value={error === null ? null : error * 100} decimals={2} signed unit="%" />
          {check && error !== null && (
            <>
              , <Figure value={error * check.distanceMm} decimals={1} signed unit="mm" />
            </>
          )}
        </dd>
        <dt>Turned to be level by</dt>
        <dd data-testid="rotation">
          <Figure value={result?.rotationDeg} decimals={2} signed unit="°" />
        </dd>
      </dl>
      {isDoubtful && (
        <p className="mt-2 text-sm text-red">
          More than half a percent off. Zoom in and pick the points again, or look whether one of the two distances is
          typed wrong.
        </p>
      )}
    </section>
  );
}
