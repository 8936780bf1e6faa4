/** A petrol line that passes along the top of what is being fetched; the words are read aloud. */
export function LoadingLine({ label = 'Loading' }: { label?: string }) {
  return (
    <div role="status" className="relative h-0.5 w-full overflow-hidden bg-hair">
      <span className="sr-only">{label}</span>
      <span aria-hidden className="absolute inset-y-0 left-0 w-1/4 animate-pass bg-petrol" />
    </div>
  );
}
