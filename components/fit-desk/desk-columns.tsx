import type { ReactNode } from 'react';

/**
 * Assumed, measured, follows: side by side where there is room; on a narrow window measured, follows,
 * assumed. The reading order follows what is seen where the browser can do that.
 */
export function DeskColumns({
  assumed,
  measured,
  follows,
}: {
  assumed: ReactNode;
  measured: ReactNode;
  follows: ReactNode;
}) {
  return (
    <div className="grid gap-x-5 gap-y-8 pt-4 [reading-flow:grid-order] lg:grid-cols-[18.5rem_minmax(0,1fr)] xl:grid-cols-[19.5rem_minmax(0,5fr)_minmax(0,8fr)]">
      <section
        aria-label="What is assumed"
        className="order-3 min-w-0 lg:order-none lg:row-span-2 xl:row-span-1"
      >
        {assumed}
      </section>
      <section
        aria-label="What was measured"
        className="order-1 grid min-w-0 content-start gap-6 lg:order-none"
      >
        {measured}
      </section>
      <section aria-label="What follows" className="order-2 min-w-0 lg:order-none">
        {follows}
      </section>
    </div>
  );
}
