import { createRoot } from 'react-dom/client';
import { worksheetNamed } from '@/domain/worksheets/registry';
import type { BoundLimit } from './bound';
import { OnSheet } from './OnSheet';

/**
 * Opens a worksheet of a sheet in `place`, which is empty. Loaded when somebody asks for it: a sheet to read weighs
 * next to nothing. Calls `onClose` after taking itself away.
 */
export function openWorksheet(
  place: HTMLElement,
  name: string,
  limits: readonly BoundLimit[],
  onClose: () => void,
): void {
  const worksheet = worksheetNamed(name);
  if (!worksheet) return;
  const root = createRoot(place);
  const units = document.documentElement.dataset['units'] === 'inch' ? 'inch' : 'metric';
  root.render(
    <OnSheet
      worksheet={worksheet}
      limits={limits}
      units={units}
      rules={{}}
      onClose={() => {
        root.unmount();
        onClose();
      }}
    />,
  );
}
