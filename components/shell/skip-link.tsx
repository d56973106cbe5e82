export function SkipLink() {
  return (
    <a
      href="#content"
      className="no-print fixed top-2 left-2 z-50 -translate-y-20 rounded-[4px] bg-ink px-4 py-2 text-sm font-semibold text-paper focus:translate-y-0"
    >
      Skip to the content
    </a>
  );
}
