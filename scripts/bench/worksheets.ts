import { workOut } from '@/domain/worksheets/work';
import { WORKSHEETS } from '@/domain/worksheets/registry';
import { nest } from '@/domain/worksheets/typedIn';
import { openPage } from './browser';

/** The slowest worksheet: mean milliseconds to read its example's inputs and work them out, of 300 runs after 50 to warm up. */
export function slowestWorksheet(): { name: string; ms: number } {
  const times = WORKSHEETS.map((worksheet) => {
    const raw = nest(worksheet.fields, worksheet.example);
    const run = (times: number) => {
      for (let i = 0; i < times; i++) workOut(worksheet, raw);
    };
    run(50);
    const from = performance.now();
    run(300);
    return { name: worksheet.name, ms: (performance.now() - from) / 300 };
  });
  return times.reduce((worst, one) => (one.ms > worst.ms ? one : worst));
}

/**
 * Typing into a calculator in a real browser, its worked case filled in: main-thread work per key press to the painted
 * answer, and the frames that were late. A frame is late where more than two frames' time lies between it and the one
 * before.
 */
export async function calculatorTyping(
  address: string,
  cookie: string,
  name: string,
): Promise<{ p95: number; late: number; frames: number }> {
  const { page, close } = await openPage(address, cookie);
  await page.goto(`${address}/handbook/calculators/${name}`, { waitUntil: 'load' });
  await page.waitForFunction(() => !document.querySelector('astro-island[ssr]'));
  await page.getByRole('button', { name: 'Try a worked case' }).click();
  await page.evaluate(() => {
    const seen = { spans: [] as number[], gaps: [] as number[] };
    (window as unknown as { seen: typeof seen }).seen = seen;
    document.addEventListener(
      'input',
      () => {
        const pressed = performance.now();
        // After React has answered: the next task but one runs once the frame with the answer is committed.
        requestAnimationFrame(() => {
          const channel = new MessageChannel();
          channel.port1.onmessage = () => seen.spans.push(performance.now() - pressed);
          channel.port2.postMessage(null);
        });
      },
      true,
    );
    let before = performance.now();
    const frame = (now: number) => {
      seen.gaps.push(now - before);
      before = now;
      requestAnimationFrame(frame);
    };
    requestAnimationFrame(frame);
  });
  const boxes = await page.locator('form input.field-box:visible').all();
  for (const box of boxes.slice(0, 12)) {
    await box.fill('');
    await box.pressSequentially('12.34', { delay: 70 });
  }
  const seen = await page.evaluate(() => (window as unknown as { seen: { spans: number[]; gaps: number[] } }).seen);
  await close();
  const spans = seen.spans.sort((a, b) => a - b);
  return {
    p95: spans[Math.floor(spans.length * 0.95)] ?? NaN,
    late: seen.gaps.filter((gap) => gap > 2 * (1000 / 60)).length,
    frames: seen.gaps.length,
  };
}
