import { afterEach, beforeEach, expect, vi } from 'vitest';

// A warning that nobody expected is a fault that nobody looked at: it fails the test that caused it.
beforeEach(() => {
  vi.spyOn(console, 'error').mockImplementation(() => {});
  vi.spyOn(console, 'warn').mockImplementation(() => {});
});

afterEach(() => {
  expect(vi.mocked(console.error).mock.calls).toEqual([]);
  expect(vi.mocked(console.warn).mock.calls).toEqual([]);
  vi.restoreAllMocks();
});
