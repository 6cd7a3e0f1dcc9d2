/** Rules on which keys of one object go together. */
import type * as z from 'zod'
import { fieldsOf } from '../rules/view.ts'

/** Rules on an object run even where a part of it could not be read, so that one pass names every fault. */
export const onObject = { when: (read: { readonly value: unknown }) => fieldsOf(read.value) !== undefined }

/** The same for a list. */
export const onList = { when: (read: { readonly value: unknown }) => Array.isArray(read.value) }

/** Says something about the object itself, or about one of its keys. */
export const complain = (ctx: z.core.$RefinementCtx, message: string, ...path: (string | number)[]): void =>
  ctx.addIssue({ code: 'custom', message, path })

/** Which of these keys an object has. */
export const given = (value: unknown, keys: readonly string[]): readonly string[] =>
  typeof value === 'object' && value !== null ? keys.filter((key) => Object.hasOwn(value, key)) : []

/** Exactly one of the keys must be given. */
export const exactlyOne = (ctx: z.core.$RefinementCtx, value: unknown, keys: readonly string[]): void => {
  const present = given(value, keys)
  if (present.length === 1) return
  const found = present.length > 0 ? listed(present, 'and') : keys.length === 2 ? 'neither' : 'none of them'
  complain(ctx, `exactly one of ${listed(keys, 'and')} is due; found ${found}`)
}

/** Where the first key is given, the second is due. */
export const needs = (
  ctx: z.core.$RefinementCtx,
  value: unknown,
  key: string,
  needed: string,
  why: string,
): void => {
  if (given(value, [key]).length === 1 && given(value, [needed]).length === 0) {
    complain(ctx, `is missing; ${why}`, needed)
  }
}

/** "a, b and c" */
export const listed = (words: readonly string[], joint: 'and' | 'or'): string =>
  words.length < 2 ? words.join('') : `${words.slice(0, -1).join(', ')} ${joint} ${words.at(-1)}`
