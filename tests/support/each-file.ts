import { afterEach, beforeEach, vi } from 'vitest';

// An unexpected console error is a failure: a page or a service that complains is not working.
let complaints: unknown[][] = [];

beforeEach(() => {
  complaints = [];
  vi.spyOn(console, 'error').mockImplementation((...args: unknown[]) => {
    complaints.push(args);
  });
});

afterEach(() => {
  const heard = complaints;
  complaints = [];
  if (heard.length > 0) throw new Error(`Unexpected console.error: ${heard.map((a) => a.join(' ')).join('\n')}`);
});
