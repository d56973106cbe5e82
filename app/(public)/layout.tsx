import { currentViewer } from '@/app/_server/viewer';
import { Footer } from '@/components/shell/footer';
import { PublicBar } from '@/components/shell/public-bar';

import { DeskBar } from '../(desk)/desk-bar';

export default async function PublicLayout({ children }: LayoutProps<'/'>) {
  const viewer = await currentViewer();
  return (
    <div className="flex min-h-dvh flex-col">
      {viewer ? <DeskBar viewer={viewer} /> : <PublicBar />}
      <main id="content" tabIndex={-1} className="page flex-1 pb-16 outline-none">
        {children}
      </main>
      <Footer />
    </div>
  );
}
