import type { ReactNode } from 'react'
import { Responsibility } from '@/components/Caution.tsx'
import { useTitle } from '@/hooks/title.ts'
import { Wordmark } from '@/components/Mark.tsx'
import { BendDrawing, FlatDrawing } from './BendDrawing.tsx'

const ZONES = ['1', '2', '3', '4', '5', '6']
const LETTERS = ['A', 'B', 'C', 'D']

/** Pages before the bar: a drawing sheet with its zones, and the form where a drawing has its title block. */
export function AccountSheet({ title, about, children }: { title: string; about: ReactNode; children: ReactNode }) {
  useTitle(title)
  return (
    <main className="flex min-h-dvh flex-col bg-paper p-3 sm:p-6">
      <div className="relative flex grow flex-col border border-edge bg-sheet sm:p-6">
        <div aria-hidden="true" className="absolute inset-x-6 top-0 hidden h-6 text-xs leading-6 text-soft sm:flex">
          {ZONES.map((zone) => (
            <span key={zone} className="grow basis-0 border-r border-rule text-center last:border-r-0">
              {zone}
            </span>
          ))}
        </div>
        <div aria-hidden="true" className="absolute inset-y-6 left-0 hidden w-6 flex-col text-xs text-soft sm:flex">
          {LETTERS.map((letter) => (
            <span key={letter} className="flex grow basis-0 items-center justify-center border-b border-rule last:border-b-0">
              {letter}
            </span>
          ))}
        </div>
        <div className="flex grow flex-col justify-between border-ink sm:border">
          <div className="hidden min-h-56 grow basis-56 items-center justify-center px-8 py-6 sm:flex lg:justify-between lg:px-[8%]">
            <BendDrawing className="max-h-[26rem] w-full max-w-md" />
            <FlatDrawing className="hidden w-[36%] max-w-lg lg:block" />
          </div>
          <div className="grow border-ink sm:ml-auto sm:w-full sm:max-w-2xl sm:grow-0 sm:border-t sm:border-l lg:max-w-3xl">
            <div className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2 border-b border-ink px-5 py-4">
              <Wordmark />
              <p className="text-sm text-soft">Welding procedures, from coupon to shop</p>
            </div>
            <div className="grid sm:grid-cols-[2fr_3fr]">
              <div className="border-ink px-5 py-5 max-sm:pb-0 sm:border-r">
                <h1 className="font-narrow text-2xl font-semibold">{title}</h1>
                <div className="mt-2 space-y-2 text-pretty text-soft">{about}</div>
              </div>
              <div className="px-5 py-5">{children}</div>
            </div>
            <div className="border-t border-ink px-5 py-2.5">
              <Responsibility />
            </div>
          </div>
        </div>
      </div>
    </main>
  )
}
