/** Forms parse with the same zod schemas as the API, and what the server refuses lands on the field it names. */
import { zodResolver } from '@hookform/resolvers/zod'
import { useForm, type DefaultValues, type FieldValues, type Path, type UseFormReturn } from 'react-hook-form'
import type { z } from 'zod'
import { asProblem } from './problem.ts'

/** react-hook-form over a zod object: says what is wrong once a field has been left, and keeps what was typed. */
export const useZodForm = <In extends FieldValues, Out extends FieldValues>(schema: z.ZodType<Out, In>, defaultValues: DefaultValues<In>): UseFormReturn<In, unknown, Out> =>
  useForm<In, unknown, Out>({ resolver: zodResolver(schema), defaultValues, mode: 'onTouched' })

/**
 * Puts a failed call onto the form: each named field gets its message, anything else becomes the form's own message
 * (`form.formState.errors.root?.message`). Focus goes to the first field at fault. Nothing typed is touched.
 */
export function showProblem<In extends FieldValues, Out>(form: UseFormReturn<In, unknown, Out>, error: unknown): void {
  const problem = asProblem(error)
  const known = new Set(Object.keys(form.getValues()))
  const onFields = problem.fields.filter(({ field }) => known.has(field.split('.')[0] ?? ''))
  onFields.forEach(({ field, message }, index) => form.setError(field as Path<In>, { type: 'server', message }, { shouldFocus: index === 0 }))
  const rest = problem.fields.filter((entry) => !onFields.includes(entry)).map(({ message }) => message)
  if (onFields.length === 0 || rest.length > 0) form.setError('root', { type: 'server', message: [problem.message, ...rest].join(' ') })
}
