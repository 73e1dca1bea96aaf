import { notifyManager, QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { useState } from 'react';
import { Desk, type DeskProps } from './Desk';

// An answer is drawn in the task that brings it. By default it would wait for a timer, which a key press can feel.
notifyManager.setScheduler(queueMicrotask);

/** Look up, as an island: the server has made the same page already, so nothing moves when it comes to life. */
export function LookUp(props: DeskProps) {
  const [client] = useState(() => new QueryClient());
  return (
    <QueryClientProvider client={client}>
      <Desk {...props} />
    </QueryClientProvider>
  );
}
