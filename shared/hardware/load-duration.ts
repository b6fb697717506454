/**
 * Load duration factor C_D of NDS-2018 table 2.3.2 (from memory). What hangs on a wall hangs there for good: `permanent`.
 * Impact (2.0) is left out, for the standard does not allow it for connections.
 */
export const loadDuration = {
  permanent: 0.9,
  'ten years': 1,
  'two months': 1.15,
  'seven days': 1.25,
  'ten minutes': 1.6,
} as const;
export type LoadDuration = keyof typeof loadDuration;
