import { cookies } from 'next/headers';
import { connection } from 'next/server';
import type { Metadata, Viewport } from 'next';

import { SkipLink } from '@/components/shell/skip-link';
import { THEME_COOKIE, themeFrom } from '@/components/shell/theme';

import { fontVariables } from './fonts';
import './globals.css';

export const metadata: Metadata = {
  title: { default: 'Strandline', template: '%s · Strandline' },
  description:
    'Turns energy scans taken with low-energy implanted muons into carrier profiles near a semiconductor surface.',
  icons: { icon: { url: '/icon.svg', type: 'image/svg+xml' } },
  formatDetection: { telephone: false, email: false, address: false, date: false },
};

export const viewport: Viewport = {
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: '#f7f4ed' },
    { media: '(prefers-color-scheme: dark)', color: '#0f1a20' },
  ],
};

export default async function RootLayout({ children }: LayoutProps<'/'>) {
  // Every page is made for its request: the content security policy carries a nonce of that request.
  await connection();
  const theme = themeFrom((await cookies()).get(THEME_COOKIE)?.value);
  return (
    <html lang="en" data-theme={theme === 'system' ? undefined : theme} className={fontVariables}>
      <body>
        <SkipLink />
        {children}
      </body>
    </html>
  );
}
