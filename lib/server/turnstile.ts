/**
 * Lets `places` tasks run at a time and the others wait in line: for work that holds much memory, such as decoding pictures.
 * A task that fails gives its place on like any other.
 */
export function turnstile(places: number): <T>(task: () => Promise<T>) => Promise<T> {
  let free = places;
  const waiting: (() => void)[] = [];

  return async (task) => {
    if (free > 0) free -= 1;
    else await new Promise<void>((resolve) => waiting.push(resolve));
    try {
      return await task();
    } finally {
      const next = waiting.shift();
      if (next) next();
      else free += 1;
    }
  };
}
