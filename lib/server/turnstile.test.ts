import { describe, expect, it } from 'vitest';
import { turnstile } from './turnstile';

describe('turnstile', () => {
  it('never lets more than its places in, and lets everyone through', async () => {
    const pass = turnstile(2);
    let inside = 0;
    let most = 0;
    const task = async (index: number): Promise<number> => {
      inside += 1;
      most = Math.max(most, inside);
      await new Promise((resolve) => setImmediate(resolve));
      inside -= 1;
      return index;
    };
    const results = await Promise.all([0, 1, 2, 3, 4].map((index) => pass(() => task(index))));
    expect(results).toEqual([0, 1, 2, 3, 4]);
    expect(most).toBe(2);
  });

  it('gives the place of a failed task on', async () => {
    const pass = turnstile(1);
    await expect(pass(() => Promise.reject(new Error('torn')))).rejects.toThrow('torn');
    await expect(pass(() => Promise.resolve('next'))).resolves.toBe('next');
  });
});
