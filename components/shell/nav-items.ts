export type NavItem = {
  href: string;
  label: string;
  /** Paths, besides its own, under which the item is the current one. */
  also?: readonly string[];
};

export const NAV_ITEMS: readonly NavItem[] = [
  { href: '/samples', label: 'Samples', also: ['/scans'] },
  { href: '/stopping', label: 'Stopping sets' },
  { href: '/fits', label: 'Fits', also: ['/compare'] },
  { href: '/reviews', label: 'Reviews' },
  { href: '/profiles', label: 'Issued profiles' },
  { href: '/team', label: 'Team' },
];

export function isCurrent(item: NavItem, pathname: string): boolean {
  return [item.href, ...(item.also ?? [])].some(
    (path) => pathname === path || pathname.startsWith(`${path}/`),
  );
}
