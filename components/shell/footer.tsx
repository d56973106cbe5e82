import Link from 'next/link';

export function Footer() {
  return (
    <footer className="no-print border-t border-rule">
      <div className="page flex flex-wrap gap-x-5 gap-y-1 py-3 text-[0.8125rem] text-ink-3">
        <span>A fitted profile is a model-dependent estimate, valid only within its reach.</span>
        <Link href="/help" className="ml-auto text-ink-2 hover:text-ink hover:underline">
          How every number is computed
        </Link>
      </div>
    </footer>
  );
}
