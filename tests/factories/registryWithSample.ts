import { vi } from 'vitest';
import type * as Registry from '@/domain/worksheets/registry';
import { SAMPLE_WORKSHEET } from './sampleWorksheet';

/**
 * The registry and a worksheet of the tests' own, so that a test does not hang on what is registered:
 * `vi.mock('@/domain/worksheets/registry', () => import('…/registryWithSample'))`.
 */
const real = await vi.importActual<typeof Registry>('@/domain/worksheets/registry');

export const WORKSHEETS = [...real.WORKSHEETS, SAMPLE_WORKSHEET];
export const worksheetNamed: typeof real.worksheetNamed = (name) => WORKSHEETS.find((one) => one.name === name);
