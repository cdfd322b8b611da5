import { type ComponentProps, type MouseEvent } from 'react';
import { useHref, useLinkClickHandler, useLocation, useResolvedPath } from 'react-router-dom';

export interface RouterLinkProps extends Omit<ComponentProps<'a'>, 'href'> {
  /** An address of this shop, from `paths`. */
  to: string;
  /** Puts the address in the place of the present one in the history. */
  replace?: boolean;
}

/**
 * A link that changes the page without loading the application again. The router's own `Link` and `NavLink` do
 * the same, but carry the prefetching of its framework mode along: 2 kB of every first visit.
 */
export function RouterLink({ to, replace, target, onClick, ...anchor }: RouterLinkProps) {
  const href = useHref(to);
  const follow = useLinkClickHandler<HTMLAnchorElement>(to, { replace, target });
  const click = (event: MouseEvent<HTMLAnchorElement>) => {
    onClick?.(event);
    if (!event.defaultPrevented) follow(event);
  };
  return <a {...anchor} href={href} target={target} onClick={click} />;
}

export interface RouterNavLinkProps extends RouterLinkProps {
  /** Marks only the address itself, not those below it. */
  isExact?: boolean;
}

/** Says by `aria-current` that it leads to the present page, or to one above it. */
export function RouterNavLink({ isExact, ...link }: RouterNavLinkProps) {
  const here = useLocation().pathname;
  const there = useResolvedPath(link.to).pathname;
  const isCurrent = here === there || (!isExact && there !== '/' && here.startsWith(`${there}/`));
  return <RouterLink aria-current={isCurrent ? 'page' : undefined} {...link} />;
}
