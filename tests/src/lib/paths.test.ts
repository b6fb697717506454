import { describe, expect, it } from 'vitest';
import { paths, safeBack } from '../../../src/lib/paths.ts';

describe('the way back after signing in', () => {
  it('goes to a page of ours', () => {
    const [, query] = paths.signIn('/jobs/1?find=oak').split('?back=');
    expect(safeBack(decodeURIComponent(query ?? ''))).toBe('/jobs/1?find=oak');
  });

  it.each(['//elsewhere.example', '/\\elsewhere.example', 'https://elsewhere.example', 'javascript:alert(1)', ''])('never leads elsewhere: %s', (back) => {
    expect(safeBack(back)).toBe(paths.jobs);
  });
});
