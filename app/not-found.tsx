import { PublicBar } from '@/components/shell/public-bar';
import { NothingHere } from '@/components/shell/nothing-here';

/** For addresses that no page has; inside the desk its own page answers, with the top bar. */
export default function NotFound() {
  return (
    <>
      <PublicBar />
      <main id="content" tabIndex={-1} className="page outline-none">
        <NothingHere />
      </main>
    </>
  );
}
