import type { ReadBy as Count } from '@/domain/revision/timeline';

/** How many have read and signed a bulletin, of those who were asked and whom the reader may count. */
export const ReadBy = ({ count }: { count: Count | null }) =>
  count && (
    <p>
      Read and signed by {count.signed} of {count.asked} {count.all ? 'readers of the book' : 'in your shop'}
    </p>
  );
