import { describe, expect, it } from 'vitest';
import { withBlock } from './environment.mjs';

const values = { APP_URL: 'http://localhost:1', AUTH_SECRET: 'first' };

describe('the block in an .env file', () => {
  it('is the whole of a new file', () => {
    expect(withBlock('', values)).toMatch(/^# ──.*\nAPP_URL="http:\/\/localhost:1"\nAUTH_SECRET="first"\n# ──.*\n$/);
  });

  it('leaves what a developer has written above and below as it was, however often it is renewed', () => {
    const first = `${withBlock('# mine\nLOG_LEVEL=debug', values)}MAP_THREADS=2\n`;
    const second = withBlock(first, { ...values, AUTH_SECRET: 'second' });
    expect(second).toBe(first.replace('first', 'second'));
    expect(withBlock(second, values)).toBe(first);
    expect(first.startsWith('# mine\nLOG_LEVEL=debug\n# ──')).toBe(true);
    expect(first.endsWith('MAP_THREADS=2\n')).toBe(true);
  });
});
