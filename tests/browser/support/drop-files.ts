import type { Page } from 'playwright-core';

export interface DroppedFile {
  readonly name: string;
  readonly text: string;
}

/** Drops files on the drop zone as a hand with a mouse does: the browser's own drag data and events. */
export async function dropFiles(page: Page, files: readonly DroppedFile[]): Promise<void> {
  const zone = page.locator('nl-drop-zone');
  const data = await page.evaluateHandle((each) => {
    const transfer = new DataTransfer();
    for (const { name, text } of each) transfer.items.add(new File([text], name));
    return transfer;
  }, files);
  await zone.dispatchEvent('dragenter', { dataTransfer: data });
  await zone.dispatchEvent('drop', { dataTransfer: data });
}
