import { currentViewer } from '@/app/_server/viewer';
import { NothingHere } from '@/components/shell/nothing-here';
import { PublicBar } from '@/components/shell/public-bar';

import { DeskBar } from './(desk)/desk-bar';

/** For addresses that no page has; inside the desk its own page answers. */
export default async function NotFound() {
  const viewer = await currentViewer();
  return (
    <>
      {viewer ? <DeskBar viewer={viewer} /> : <PublicBar />}
      <main id="content" tabIndex={-1} className="page outline-none">
        <NothingHere />
      </main>
    </>
  );
}
