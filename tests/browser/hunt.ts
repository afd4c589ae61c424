import type { Locator } from 'playwright-core';
import type { Visitor } from './visitor';

/** More steps than any hunt of the demo takes. */
const MOST_STEPS = 40;

/**
 * Answers what the screen asks for, with the practice lift as the meter, until a finding is offered.
 * @param look called on every step with what the screen shows
 * @returns how many readings were saved
 */
export async function huntByPractice(
  visitor: Visitor,
  look: (kind: 'cautions' | 'reading' | 'relay' | 'finding') => Promise<void> = async () =>
    undefined,
): Promise<number> {
  const { page } = visitor;
  const understood = visitor.button('Understood');
  const putOn = visitor.button('Practice: put the probes on');
  const lookAt = visitor.button('Practice: look');
  const finding = page.getByRole('link', { name: 'State the finding' });
  let readings = 0;
  for (let step = 0; step < MOST_STEPS; step++) {
    await understood.or(putOn).or(lookAt).or(finding).first().waitFor();
    if (await finding.isVisible()) {
      await look('finding');
      return readings;
    }
    if (await understood.isVisible()) {
      await look('cautions');
      await tap(understood);
      await understood.waitFor({ state: 'hidden' });
    } else if (await lookAt.isVisible()) {
      await look('relay');
      await tap(lookAt);
    } else {
      await look('reading');
      const before = await leadOf(visitor);
      if (!(await tap(putOn))) continue;
      await page.waitForFunction(
        () => (document.querySelector<HTMLInputElement>('#volts')?.value ?? '') !== '',
      );
      await visitor.button('Save').click();
      readings += 1;
      await page.waitForFunction(
        (text) => (document.querySelector('app-probe-cards')?.textContent ?? '') !== text,
        before,
      );
    }
  }
  throw new Error(`No finding after ${MOST_STEPS} steps.`);
}

/** How long a button that was there may take, milliseconds; what the engine asks may change meanwhile. */
const QUICK = 3_000;

/** Touches it; false where it went away before, because the engine's next question came. */
async function tap(target: Locator): Promise<boolean> {
  try {
    await target.click({ timeout: QUICK });
    return true;
  } catch {
    return false;
  }
}

const leadOf = async ({ page }: Visitor): Promise<string> =>
  (await page.locator('app-probe-cards').textContent()) ?? '';
