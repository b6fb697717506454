import fc from 'fast-check';
import { afterEach, beforeEach, vi } from 'vitest';

// Properties are tried on the same cases every time, so that a run can be trusted and repeated; FC_SEED tries others.
fc.configureGlobal({ seed: Number(process.env.FC_SEED ?? 20_261_201) });

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
