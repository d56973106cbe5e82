/** Holds the place of a page: its header and some rows, in the sizes that they will have. */
export function PageLoading({ rows = 6 }: { rows?: number }) {
  return (
    <div role="status" aria-label="Loading">
      <div className="border-b border-ink pt-5 pb-4">
        <div className="h-8 w-64 max-w-full bg-rule/60" />
        <div className="mt-2 h-4 w-96 max-w-full bg-rule/40" />
      </div>
      <div className="pt-7">
        {Array.from({ length: rows }, (_, row) => (
          <div key={row} className="border-b border-rule py-3">
            <div className="h-4 w-full bg-rule/40" />
          </div>
        ))}
      </div>
    </div>
  );
}
