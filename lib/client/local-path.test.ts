import { describe, expect, it } from 'vitest';
import { localPath } from './local-path';

describe('localPath', () => {
  it('keeps a path of this site with its query and fragment', () => {
    expect(localPath('/projects/7?tab=plans#top')).toBe('/projects/7?tab=plans#top');
  });

  // Forms that browsers read as another site although they start like a path (WHATWG URL, relative-slash state).
  it.each([
    '//elsewhere.example/x',
    '/\\elsewhere.example',
    '/\t/elsewhere.example',
    '/.//elsewhere.example',
    'https://elsewhere.example',
    'javascript:alert(1)',
    '/sign-in?return=%2Fprojects',
    '/api/auth/signout',
    '',
    null,
    undefined,
  ])('refuses %j', (address) => {
    expect(localPath(address)).toBe('/projects');
  });
});
