/** How a question was read, part by part, and what was not understood. */
export function Read({ read, notRead }: { read: readonly { label: string; value: string }[]; notRead: readonly string[] }) {
  return (
    <div className="space-y-2">
      {read.length > 0 && (
        <dl aria-label="How it was read" className="flex flex-wrap gap-x-5 gap-y-1.5">
          {read.map(({ label, value }) => (
            <div key={`${label} ${value}`}>
              <dt className="cell-label">{label}</dt>
              <dd className="font-medium">{value}</dd>
            </div>
          ))}
        </dl>
      )}
      {notRead.length > 0 && (
        <p className="border-l-[3px] border-l-straw bg-straw-bg px-3 py-1.5">
          Not understood: <strong className="font-semibold">{notRead.join(', ')}</strong>
        </p>
      )}
    </div>
  )
}
