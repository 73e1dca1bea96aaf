import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { useState } from 'react';
import { Session } from './Session';
import type { WritingProps } from './writingProps';

/** The desk where a proposal is written: the whole island. */
export function WritingDesk(props: WritingProps) {
  const [client] = useState(() => new QueryClient());
  return (
    <QueryClientProvider client={client}>
      <Session {...props} />
    </QueryClientProvider>
  );
}
