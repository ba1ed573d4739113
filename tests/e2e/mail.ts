import { expect, type Page } from "@playwright/test";

/** Waits for a mail at the demo's own mail server and opens it. */
export async function openMail(page: Page, to: string, subject: RegExp): Promise<void> {
  const mail = page
    .getByRole("link")
    .filter({ hasText: `to ${to}` })
    .filter({ hasText: subject });
  await expect(async () => {
    await page.goto("/demo/mail");
    await expect(mail.first()).toBeVisible({ timeout: 500 });
  }).toPass({ timeout: 60_000 });
  await mail.first().click();
}
