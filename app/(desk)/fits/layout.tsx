import { NuqsAdapter } from 'nuqs/adapters/next/app';

export default function FitsLayout({ children }: LayoutProps<'/fits'>) {
  return <NuqsAdapter>{children}</NuqsAdapter>;
}
