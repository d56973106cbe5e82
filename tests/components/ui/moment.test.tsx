import { act, render, screen } from '@testing-library/react';
import { hydrateRoot } from 'react-dom/client';
import { renderToString } from 'react-dom/server';
import { afterEach, describe, expect, it, vi } from 'vitest';

import { Moment } from '@/components/ui/moment';

/** 23:30 UTC is the next day in Tokyo, which is 9 hours ahead all year (IANA time zone database). */
const AT = '2026-03-04T23:30:00.000Z';

afterEach(() => vi.unstubAllEnvs());

describe('Moment', () => {
  it('shows a moment in the zone of the reader', () => {
    vi.stubEnv('TZ', 'Asia/Tokyo');
    render(<Moment at={AT} />);
    expect(screen.getByText('5 Mar 2026, 08:30')).toBeTruthy();
  });

  it('carries the moment in UTC for machines and on hover', () => {
    const { container } = render(<Moment at={AT} />);
    const time = container.querySelector('time');
    expect(time?.getAttribute('datetime')).toBe(AT);
    expect(time?.title).toBe('2026-03-04 23:30:00 UTC');
  });

  it('says UTC from the server and changes to the reader without a mismatch', async () => {
    vi.stubEnv('TZ', 'Asia/Tokyo');
    const host = document.createElement('div');
    host.innerHTML = renderToString(<Moment at={AT} />);
    expect(host.textContent).toBe('4 Mar 2026, 23:30 UTC');
    const onRecoverableError = vi.fn();
    await act(async () => hydrateRoot(host, <Moment at={AT} />, { onRecoverableError }));
    expect(host.textContent).toBe('5 Mar 2026, 08:30');
    expect(onRecoverableError).not.toHaveBeenCalled();
  });
});
