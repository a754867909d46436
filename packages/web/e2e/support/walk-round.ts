import type { BrowserContext, Page } from 'playwright-core';
import { vi } from 'vitest';

import type { WalkCarDto, WalkSheetDto } from '@driprail/shared/contracts/walk-round.contract';
import { PATIENCE } from './stage.ts';

/** Written where a camera writes the position; it must never leave the phone. */
export const POSITION = 'GPS 41.2 N 70.1 W';

/** A photo as a camera makes it: noise, so that it takes several pieces, with a position in its EXIF. */
export async function cameraPhoto(page: Page, width = 2000, height = 1500): Promise<Buffer> {
  const base64 = await page.evaluate(
    ([w, h]) => {
      const canvas = document.createElement('canvas');
      [canvas.width, canvas.height] = [w ?? 0, h ?? 0];
      const pen = canvas.getContext('2d');
      const pixels = pen?.createImageData(canvas.width, canvas.height);
      if (!pen || !pixels) throw new Error('no canvas');
      let seed = 7;
      // A fixed row of numbers: the same photo at each run.
      for (let at = 0; at < pixels.data.length; at += 1) {
        seed = (seed * 1103515245 + 12345) % 2147483648;
        pixels.data[at] = at % 4 === 3 ? 255 : seed >> 23;
      }
      pen.putImageData(pixels, 0, 0);
      return canvas.toDataURL('image/jpeg', 0.7).split(',')[1] ?? '';
    },
    [width, height],
  );
  const picture = Buffer.from(base64, 'base64');
  const words = Buffer.from(`Exif\0\0${POSITION}`);
  const head = Buffer.from([0xff, 0xe1, 0, words.length + 2]);
  return Buffer.concat([picture.subarray(0, 2), head, words, picture.subarray(2)]);
}

/** Takes a photo with the button in the thumb's place. */
export async function takePhoto(page: Page, buffer: Buffer, name = 'IMG_0001.jpg'): Promise<void> {
  await page.locator('.ph-act input[type=file]').setInputFiles({ name, mimeType: 'image/jpeg', buffer });
}

export async function walkCarOf(context: BrowserContext, visitId: string): Promise<WalkCarDto> {
  const answer = await context.request.get(`/api/visits/${visitId}/walk-round`);
  const [car] = ((await answer.json()) as { sheet: WalkSheetDto }).sheet.cars;
  if (!car) throw new Error('the visit has a car');
  return car;
}

/** Waits until the phone holds a visit's walk-round for a dead zone. */
export async function untilWalkKept(page: Page, visitId: string): Promise<void> {
  await vi.waitFor(
    async () => {
      const keys = await page.evaluate(
        () =>
          new Promise<string[]>((resolve, reject) => {
            const opening = indexedDB.open('driprail-phone');
            opening.onerror = () => reject(new Error('no store'));
            opening.onsuccess = () => {
              const asked = opening.result.transaction('copies').objectStore('copies').getAllKeys();
              asked.onsuccess = () => {
                opening.result.close();
                resolve(asked.result.map(String));
              };
            };
          }),
      );
      if (!keys.some((key) => key.endsWith(`:walk-round:${visitId}`))) throw new Error('not kept yet');
    },
    { timeout: PATIENCE, interval: 200 },
  );
}

/** Presses Start work and says why there is no walk-round. */
export async function startWithoutWalk(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Start work', exact: true }).click();
  const asked = page.getByRole('dialog', { name: 'No walk-round yet' });
  await asked.getByRole('button', { name: 'Customer in a hurry' }).click();
  await asked.getByRole('button', { name: 'Start without it' }).click();
  await asked.waitFor({ state: 'detached' });
}
