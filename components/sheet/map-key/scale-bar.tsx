import { scaleColour, type MapScale } from '@/lib/layout/scales';

const STEPS = 24;

/** A scale from poor to good as a row of flat steps. */
export function ScaleBar({ scale, className }: { readonly scale: MapScale; readonly className?: string }) {
  return (
    <svg
      viewBox={`0 0 ${STEPS} 1`}
      preserveAspectRatio="none"
      className={className}
      shapeRendering="crispEdges"
      aria-hidden
    >
      {Array.from({ length: STEPS }, (_, step) => (
        <rect key={step} x={step} width="1.02" height="1" fill={scaleColour(scale, step / (STEPS - 1))} />
      ))}
    </svg>
  );
}
