/** What a supervisor wants changed, above the sheet. */
export function Returned({ comment, by }: { comment: string; by: string }) {
  return (
    <section aria-label="Returned for change" className="mt-4 border-l-[3px] border-l-plum bg-plum-bg px-4 py-3">
      <p className="font-semibold">Returned by {by}</p>
      <p className="mt-0.5 max-w-prose whitespace-pre-line">{comment}</p>
    </section>
  )
}
