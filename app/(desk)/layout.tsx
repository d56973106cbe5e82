import { Footer } from '@/components/shell/footer';

import { DeskBar } from './desk-bar';
import { readViewer } from './read-viewer';

export default async function DeskLayout({ children }: LayoutProps<'/'>) {
  const viewer = await readViewer();
  return (
    <div className="flex min-h-dvh flex-col">
      <DeskBar viewer={viewer} />
      <main id="content" tabIndex={-1} className="page flex-1 pb-16 outline-none">
        {children}
      </main>
      <Footer />
    </div>
  );
}
