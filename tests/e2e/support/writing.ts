import { expect, type Locator, type Page } from '@playwright/test';

/** The writing desk of a proposal, by what stands on its screen. */
export class WritingDesk {
  constructor(readonly page: Page) {}

  /** The draft's id, from the address. */
  get id(): string {
    return /\/proposals\/([0-9a-f-]{36})/.exec(this.page.url())?.[1] ?? '';
  }

  get middle(): Locator {
    return this.page.getByRole('region', { name: 'What is being written' });
  }
  stepTitle = (number: number): Locator => this.middle.getByLabel(`Step ${number}, what to do`);
  /** The words of the step, once they can be written in. */
  get how(): Locator {
    return this.middle.getByRole('textbox', { name: 'How', exact: true });
  }
  chip = (words: string | RegExp): Locator => this.how.locator('.chip', { hasText: words });

  /** Types `words` in the place of all that the step says. */
  async write(words: string): Promise<void> {
    await this.how.click();
    await this.page.keyboard.press('ControlOrMeta+a');
    await this.page.keyboard.type(words);
  }

  /** Pastes what another program put on the clipboard into the words, at the caret. */
  async paste(data: Record<string, string>): Promise<void> {
    await this.how.evaluate((field, given) => {
      const clipboardData = new DataTransfer();
      for (const [type, text] of Object.entries(given)) clipboardData.setData(type, text);
      field.dispatchEvent(new ClipboardEvent('paste', { clipboardData, bubbles: true, cancelable: true }));
    }, data);
  }
  get reason(): Locator {
    return this.middle.getByLabel('Why this is better, for the editor');
  }
  /** What the desk says about the draft: `kept`, `waiting`, `unreachable`, `stale` … */
  get keeping(): Locator {
    return this.page.locator('[data-keeping]');
  }

  async ready(): Promise<void> {
    await expect(this.page).toHaveURL(/\/proposals\/[0-9a-f-]{36}\/edit/);
    // The time since the draft was kept is told by the script alone.
    await expect(this.keeping).toHaveText(/^(Draft kept .|Not kept|Kept on this device|Keeping|Changed elsewhere)/);
  }

  async choose(step: string): Promise<void> {
    await this.page.getByRole('navigation', { name: 'Parts of the sheet' }).getByRole('link', { name: step }).click();
  }

  async kept(): Promise<void> {
    await expect(this.keeping).toHaveAttribute('data-keeping', 'kept');
  }

  async propose(): Promise<void> {
    await this.page.getByRole('button', { name: 'Propose', exact: true }).click();
    await expect(this.page).toHaveURL(/\/proposals\/[0-9a-f-]{36}\?done=proposed$/);
  }
}
