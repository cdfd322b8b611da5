import { Box } from '@chakra-ui/react/box';
import { type ReactNode, Suspense, useEffect, useRef } from 'react';
import { Outlet, useLocation, useNavigationType } from 'react-router-dom';
import { Band } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { mainId, SkipLink } from '../../ui/skip-link.js';
import { PageBoundary } from '../page-boundary.js';

/** A new page starts at its top and takes the focus there, as a loaded page would; Back leaves both to the browser. */
function useArrival() {
  const main = useRef<HTMLElement>(null);
  const { pathname, hash } = useLocation();
  const how = useNavigationType();
  const lastPath = useRef(pathname);
  useEffect(() => {
    if (lastPath.current === pathname) return;
    lastPath.current = pathname;
    if (how === 'POP' || hash) return;
    window.scrollTo(0, 0);
    main.current?.focus({ preventScroll: true });
  }, [pathname, hash, how]);
  return main;
}

export interface PageFrameProps {
  skipLabel: string;
  header: ReactNode;
  footer: ReactNode;
  /** In place of the page: a refusal. */
  children?: ReactNode;
}

export function PageFrame({ skipLabel, header, footer, children }: PageFrameProps) {
  const main = useArrival();
  const { pathname } = useLocation();
  return (
    <Box minHeight="100dvh" display="flex" flexDirection="column">
      <SkipLink>{skipLabel}</SkipLink>
      {header}
      <Box as="main" id={mainId} ref={main} tabIndex={-1} outline="none" flex="1 0 auto">
        <PageBoundary resetKey={pathname}>
          {children ?? (
            <Suspense
              fallback={
                <Band>
                  <SkeletonLines lines={5} />
                </Band>
              }
            >
              <Outlet />
            </Suspense>
          )}
        </PageBoundary>
      </Box>
      {footer}
    </Box>
  );
}
