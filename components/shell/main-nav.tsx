'use client';

import Link from 'next/link';
import { usePathname } from 'next/navigation';

import { Button } from '@/components/ui/button';
import { Menu } from '@/components/ui/menu';
import { MenuLink } from '@/components/ui/menu-items';

import { isCurrent, NAV_ITEMS } from './nav-items';

type MainNavProps = {
  /** Fits that wait for this person's decision. */
  waiting: number;
};

/** A row of sections where there is room, one menu where there is not. */
export function MainNav({ waiting }: MainNavProps) {
  const pathname = usePathname();
  return (
    <>
      <nav aria-label="Sections" className="hidden self-stretch lg:block">
        <ul className="flex h-full gap-5.5">
          {NAV_ITEMS.map((item) => {
            const current = isCurrent(item, pathname);
            return (
              <li key={item.href} className="flex">
                <Link
                  href={item.href}
                  aria-current={current ? 'page' : undefined}
                  className="-mb-px flex items-center gap-1 border-b-2 border-transparent pt-0.5 text-sm whitespace-nowrap text-ink-2 hover:text-ink aria-[current]:border-coral aria-[current]:font-semibold aria-[current]:text-ink"
                >
                  <BoldWidth label={item.label} />
                  {item.href === '/reviews' && <Waiting count={waiting} />}
                </Link>
              </li>
            );
          })}
        </ul>
      </nav>
      <nav aria-label="Sections" className="lg:hidden">
        <Menu
          trigger={
            <Button variant="quiet" size="small">
              Sections
              <Waiting count={waiting} />
            </Button>
          }
        >
          <MenuLink href="/" current={pathname === '/'}>
            Home
          </MenuLink>
          {NAV_ITEMS.map((item) => (
            <MenuLink key={item.href} href={item.href} current={isCurrent(item, pathname)}>
              {item.label}
              {item.href === '/reviews' && <Waiting count={waiting} />}
            </MenuLink>
          ))}
        </Menu>
      </nav>
    </>
  );
}

/** Takes the room of the bold label at all times, so that its neighbours stay where they are. */
function BoldWidth({ label }: { label: string }) {
  return (
    <span
      data-label={label}
      className="after:invisible after:block after:h-0 after:overflow-hidden after:font-semibold after:content-[attr(data-label)/'']"
    >
      {label}
    </span>
  );
}

function Waiting({ count }: { count: number }) {
  if (count === 0) return null;
  return (
    <span className="text-[0.8125rem] font-semibold text-coral-ink">
      {count}
      <span className="sr-only"> waiting for you</span>
    </span>
  );
}
