import { createRoot } from 'react-dom/client';
import type { z } from 'zod';
import type { readShopRules } from '@/domain/api/operations/shop';
import { ask, Refused } from '@/components/api/ask';
import type { ShopRules } from '@/domain/worksheets/readInputs';
import { worksheetNamed } from '@/domain/worksheets/registry';
import { rulesOf } from '@/domain/worksheets/shopRules';
import type { Worksheet } from '@/domain/worksheets/worksheet';
import type { BoundLimit } from './bound';
import { OnSheet } from './OnSheet';

/** What the shop of the reader has set for a worksheet; null where that could not be fetched. */
async function fetchRules(worksheet: Worksheet): Promise<ShopRules | null> {
  if (rulesOf([worksheet]).length === 0) return {};
  try {
    const { items } = await ask<z.output<typeof readShopRules.reply>>('GET', '/shop/rules');
    return Object.fromEntries(
      items.flatMap(({ worksheet: of, field, set }) => (of === worksheet.name && set !== null ? [[field, set]] : [])),
    );
  } catch (error) {
    // Whoever works in no shop has none set.
    return error instanceof Refused && error.status === 404 ? {} : null;
  }
}

/**
 * Opens a worksheet of a sheet in `place`, which is empty and hidden until then. Loaded when somebody asks for it: a sheet to read weighs
 * next to nothing. Calls `onClose` after taking itself away.
 */
export async function openWorksheet(
  place: HTMLElement,
  name: string,
  limits: readonly BoundLimit[],
  onClose: () => void,
): Promise<void> {
  const worksheet = worksheetNamed(name);
  if (!worksheet) return;
  const rules = await fetchRules(worksheet);
  const root = createRoot(place);
  // A box in a hidden place cannot take the focus.
  place.hidden = false;
  const units = document.documentElement.dataset['units'] === 'inch' ? 'inch' : 'metric';
  root.render(
    <OnSheet
      worksheet={worksheet}
      limits={limits}
      units={units}
      rules={rules}
      onClose={() => {
        root.unmount();
        onClose();
      }}
    />,
  );
}
