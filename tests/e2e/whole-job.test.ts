import type { Page } from 'playwright-core';
import { beforeAll, describe, expect, inject, test } from 'vitest';
import type { MailItem } from '@/lib/contracts';
import { clientOf, type Client } from '../support/api';
import { listens } from '../support/arrange';
import { benchOf } from '../support/bench';
import { useBrowser } from '../support/browser';
import { signInAs, type Who } from '../support/people';
import { addSecondChart, chooseFirstChart, readChart, startReading } from '../support/by-hand';

const { visit } = useBrowser();
const VENDOR = 'Whitlow Thermal';
const PART = 'Specimen E-2';
const REASON = 'The first curve of the voltage chart has a point that lies off its line. Please place it again.';

async function windowOf(who: Who): Promise<Page> {
  const { page } = await visit();
  await signInAs(page, who);
  return page;
}

async function handIn(page: Page, note: string): Promise<void> {
  const bench = benchOf(page);
  await bench.station('Hand in');
  await page.getByText('The charts give a model').waitFor();
  await page.getByLabel('Note to the reviewer').fill(note);
  await page.getByRole('button', { name: 'Hand in', exact: true }).last().click();
  await page.getByRole('heading', { name: 'Handed in' }).waitFor();
}

async function openFromQueue(page: Page): Promise<void> {
  await page.goto('/review');
  await page.getByRole('link', { name: PART }).click();
  await page.getByRole('heading', { level: 1, name: PART }).waitFor();
  await listens(page);
}

let administrator: Client;
beforeAll(async () => {
  administrator = await clientOf(inject('baseUrl'), 'administrator');
});

const mailTo = async (recipient: string) => {
  const mails = (await (await administrator.get('/api/mail')).json()) as MailItem[];
  return mails.filter((mail) => mail.recipient === recipient && mail.subject.includes(PART));
};

describe('the whole job, as three people', () => {
  test('read by hand, handed in, returned, mended, approved, and found by the heat it pumps', async () => {
    const engineer = await windowOf('engineer');
    await startReading(engineer, { vendor: VENDOR, number: 'WT-27', partNumber: PART });
    const bench = benchOf(engineer);
    await chooseFirstChart(engineer, 'd01');
    await readChart(engineer, 'd01', 'Heat over temperature difference', 11);
    await addSecondChart(engineer, 'd03');
    await readChart(engineer, 'd03', 'Voltage over temperature difference', 12);
    await bench.saved();
    await handIn(engineer, 'Both charts by hand.');

    const librarian = await windowOf('librarian');
    await openFromQueue(librarian);
    await librarian.getByText('Both charts by hand.').first().waitFor();
    await librarian.getByRole('button', { name: 'Return', exact: true }).click();
    await librarian
      .getByText(/Say in a sentence what has to be mended/)
      .first()
      .waitFor();
    await librarian.getByLabel('What has to be mended').fill(REASON);
    await librarian.getByRole('button', { name: 'Return', exact: true }).click();
    await librarian.getByText(/^Returned\./).waitFor();

    await engineer.goto('/');
    await engineer.getByText(REASON).first().waitFor();
    await engineer.getByRole('link', { name: PART }).first().click();
    await engineer.waitForURL(/\/bench\/\d+$/);
    await listens(engineer);
    await engineer.getByText(REASON).first().waitFor();
    await bench.station('Curves');
    await bench.rows.first().click();
    await bench.canvas.focus();
    await engineer.keyboard.press('ArrowUp');
    await bench.saved();
    await engineer.getByText('draft', { exact: true }).first().waitFor();
    await handIn(engineer, 'Placed again.');

    await openFromQueue(librarian);
    await librarian.getByText('Placed again.').first().waitFor();
    await librarian.getByRole('button', { name: 'Approve' }).click();
    await librarian.getByText('Approved. Its model is in the catalogue now.').waitFor();

    const designer = await windowOf('designer');
    await designer.goto('/duty');
    await listens(designer);
    await designer.getByLabel('Heat to pump').fill('10');
    await designer.getByLabel('Cold face').fill('0 °C');
    await designer.getByLabel('Hot face').fill('27');
    await designer.getByRole('button', { name: 'Find modules' }).click();
    await designer.getByRole('link', { name: PART }).first().waitFor();
    expect(new URL(designer.url()).search).not.toBe('');
    await designer
      .getByText(/working heat sink/)
      .first()
      .waitFor();
    await designer.getByRole('link', { name: PART }).first().click();
    await designer.getByRole('heading', { level: 1, name: PART }).waitFor();
    await designer
      .getByText(/approved/i)
      .first()
      .waitFor();

    await expect.poll(async () => (await mailTo('soren@kelda.example')).map((mail) => mail.state)).toEqual(['sent', 'sent']);
    await expect
      .poll(async () => (await mailTo('ilse@kelda.example')).map((mail) => mail.subject.split(':')[0]).sort())
      .toEqual(['Approved', 'Returned']);
  });
});
