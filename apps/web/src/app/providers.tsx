import { ChakraProvider } from '@chakra-ui/react/styled-system';
import { CacheProvider } from '@emotion/react';
import type { ReactNode } from 'react';
import { SWRConfig, type SWRConfiguration } from 'swr';
import type { ApiFault } from '../lib/api-fault.js';
import { createStyleCache } from '../ui/theme/style-cache.js';
import { system } from '../ui/theme/system.js';

/** A refusal stays a refusal; only what may pass is asked again. */
const swr: SWRConfiguration<unknown, ApiFault> = {
  shouldRetryOnError: (fault: ApiFault) => fault.status === 0 || fault.status === 429 || fault.status >= 500,
  errorRetryCount: 3,
};

const styleCache = createStyleCache();

export const Providers = ({ children }: { children: ReactNode }) => (
  <CacheProvider value={styleCache}>
    <ChakraProvider value={system}>
      <SWRConfig value={swr}>{children}</SWRConfig>
    </ChakraProvider>
  </CacheProvider>
);
