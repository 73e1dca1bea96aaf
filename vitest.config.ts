/// <reference types="vitest/config" />
import { getViteConfig } from 'astro/config';

export default getViteConfig({
  test: {
    include: ['tests/{unit,integration,reference}/**/*.test.{ts,tsx}'],
    setupFiles: ['tests/setup/console.ts'],
    testTimeout: 20_000,
    hookTimeout: 30_000,
  },
});
