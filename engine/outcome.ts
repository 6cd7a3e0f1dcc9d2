/**
 * Success or a named failure: expected trouble is a value, never an exception.
 *
 * Shapes   `ok` tells which; the reader narrows before touching `value` or `failure`.
 */
export type Outcome<T, F extends { readonly kind: string }> =
  | { readonly ok: true; readonly value: T }
  | { readonly ok: false; readonly failure: F }

/** Wraps a value as success. */
export const success = <T>(value: T): { readonly ok: true; readonly value: T } => ({ ok: true, value })

/** Wraps a named failure. */
export const failed = <F extends { readonly kind: string }>(
  failure: F,
): { readonly ok: false; readonly failure: F } => ({ ok: false, failure })
