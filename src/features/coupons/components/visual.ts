import type { CouponContent } from '@shared/schemas/welding.ts'

/** The AWS codes judge the finished weld by eye as an examination of its own; to ISO 15614 it is one of the non-destructive tests. */
export const showsVisual = ({ variables, visual }: CouponContent, typed: boolean): boolean => (visual ?? null) !== null || (typed && variables.standards.some(({ standard }) => standard.startsWith('aws-')))
