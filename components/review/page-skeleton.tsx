/** Keeps the places of heading and figures while a page is read, so that nothing jumps. */
export function PageSkeleton({
  what,
  blocks,
}: {
  what: string;
  blocks: readonly ('line' | 'figure')[];
}) {
  return (
    <div role="status" className="grid gap-6 pt-8">
      <p className="font-serif text-2xl font-semibold text-ink-3">{what}</p>
      {blocks.map((block, index) => (
        <div
          key={index}
          className={`border-t border-rule ${block === 'figure' ? 'h-80' : 'h-16'}`}
          aria-hidden="true"
        />
      ))}
    </div>
  );
}
