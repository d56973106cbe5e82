export function SkipLink() {
  return (
    <a
      href="#content"
      className="no-print sr-only rounded-[4px] bg-ink px-4 py-2 text-sm font-semibold text-paper focus:not-sr-only focus:fixed focus:top-2 focus:left-2 focus:z-50 focus:px-4 focus:py-2"
    >
      Skip to the content
    </a>
  );
}
