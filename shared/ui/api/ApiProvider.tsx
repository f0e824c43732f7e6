/** Gives the screens below their server state. Stands in the outermost layout. */
import { QueryClientProvider } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { ReactNode } from 'react';

import { createQueryClient } from '@/shared/ui/api/queryClient';

/** A test gives its own `queryClient`. */
export function ApiProvider({ children, queryClient }: { children: ReactNode; queryClient?: QueryClient }) {
  const [own] = useState(() => queryClient ?? createQueryClient());
  return <QueryClientProvider client={own}>{children}</QueryClientProvider>;
}
