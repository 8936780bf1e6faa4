import path from 'node:path';
import type { NextConfig } from 'next';
import { NextRequest } from 'next/server';
import { unstable_doesMiddlewareMatch, unstable_getResponseFromNextConfig } from 'next/experimental/testing/server';
import { describe, expect, it } from 'vitest';
import { config, proxy } from '../../proxy';

// A module of plain JavaScript, which the compiler cannot look into.
const { default: nextConfig } = (await import(path.resolve('next.config.mjs'))) as { default: NextConfig };

const address = (path: string) => `http://elbowroom.test${path}`;
const headersOf = async (path: string) =>
  (await unstable_getResponseFromNextConfig({ url: address(path), nextConfig })).headers;
const isProxied = (path: string) => unstable_doesMiddlewareMatch({ config, nextConfig, url: address(path) });
const policyOf = (path: string) => proxy(new NextRequest(address(path))).headers.get('content-security-policy') ?? '';

describe('the headers of every answer', () => {
  it.each(['/', '/projects', '/api/projects', '/share/abc'])(
    'forbid frames, sniffing and search engines: %s',
    async (path) => {
      const headers = await headersOf(path);
      expect(headers.get('x-frame-options')).toBe('DENY');
      expect(headers.get('x-content-type-options')).toBe('nosniff');
      expect(headers.get('x-robots-tag')).toContain('noindex');
    },
  );

  it.each(['/share/abc', '/reset-password/abc', '/invitation/abc'])(
    'keep an address that is a key: %s',
    async (path) => {
      const headers = await headersOf(path);
      expect(headers.get('referrer-policy')).toBe('no-referrer');
      expect(headers.get('cache-control')).toBe('no-store');
    },
  );
});

describe('the content security policy', () => {
  it('lets only scripts of ours run, with a nonce that nobody can know beforehand', () => {
    const [first, second] = [policyOf('/projects'), policyOf('/projects')];
    const script = /script-src ([^;]+)/.exec(first)?.[1];
    expect(script).toMatch(/^'self' 'nonce-[A-Za-z0-9+/=]{40,}' 'strict-dynamic'$/);
    expect(first).not.toBe(second);
    expect(first).toContain("frame-ancestors 'none'");
  });

  it('covers pages, and never an upload, whose body it would cut off at 10 MB', () => {
    for (const path of ['/', '/sign-in', '/projects/1/layouts/2', '/share/abc'])
      expect(isProxied(path), path).toBe(true);
    for (const path of ['/api/projects/1/floor-plans', '/api/account', '/_next/static/chunk.js', '/icon.svg']) {
      expect(isProxied(path), path).toBe(false);
    }
  });
});
