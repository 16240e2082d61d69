import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';
import type { BrowserContext, Page } from 'playwright-core';
import type { SequenceId } from '#shared/plant/ids';
import { findBrokenLink } from '#shared/sequences/chain';
import { startTestServer, type TestServer } from '../../backend/src/testing/test-server';
import { harborStreetSchedule, makeStore, type TestStore } from '../../backend/src/testing/test-store';
import { until } from '../../backend/src/testing/until';
import { drawSignature, LAPTOP, PHONE, TestBrowser } from './browser';
import { InstallerHands } from './installer-hands';

// The main job as its users do it: every step happens in a browser, on the built pages, against a whole server.

let server: TestServer;
let store: TestStore;
let browser: TestBrowser;
let lead: Page;
let phone: BrowserContext;
let onPhone: Page;
let packageLink = '';

beforeAll(async () => {
  server = await startTestServer({ jobs: true });
  store = await makeStore(server, 'walk');
  browser = await TestBrowser.launch(server.url);
}, 120_000);

afterAll(async () => {
  await browser.close();
  await server.close();
});

const sequenceOf = async (code: string): Promise<SequenceId> => {
  const { items } = await server.services.openings.listCircuits(store.openingId, 200, undefined);
  return items.find((row) => row.code === code)?.sequenceId as SequenceId;
};

/** One step of the walk: what comes after a step that failed would only fail for its sake, and slowly. */
let isBroken = false;
function stage(title: string, work: () => Promise<void> | void, timeout?: number): void {
  it(
    title,
    async () => {
      if (isBroken) throw new Error('An earlier step of the walk failed');
      isBroken = true;
      await work();
      isBroken = false;
    },
    timeout,
  );
}

describe('the walk', () => {
  stage(
    'lets the lead import a schedule and assign circuits',
    async () => {
      lead = await browser.signIn(await browser.device(LAPTOP), store.people.lead.email);
      await lead.getByRole('link', { name: 'Store of walk' }).click();
      await lead.getByRole('link', { name: 'Import the schedule' }).first().click();
      const file = { name: 'schedule.csv', mimeType: 'text/csv', buffer: harborStreetSchedule() };
      await lead.locator('input[type=file]').setInputFiles(file);
      await lead
        .getByText('Nothing is stored yet. ')
        .or(lead.getByText('All rows can be used'))
        .first()
        .waitFor();
      await lead.getByRole('button', { name: 'Import', exact: true }).click();
      await lead.getByText('Imported as revision 1').waitFor();
      await lead.getByRole('link', { name: 'Assign circuits' }).click();
      await lead.getByLabel('Select A17', { exact: true }).check();
      await lead.getByLabel('Select A1', { exact: true }).check();
      await lead
        .getByRole('combobox', { name: 'Assign to' })
        .selectOption({ label: 'installer of walk, Installer, walk' });
      await lead.getByRole('button', { name: 'Assign', exact: true }).click();
      await lead.getByRole('row', { name: /A17/ }).getByText('installer of walk').waitFor();
    },
    60_000,
  );

  stage(
    'walks the installer through the steps of a circuit, half of them',
    async () => {
      phone = await browser.device(PHONE);
      onPhone = await browser.signIn(phone, store.people.installer.email);
      await onPhone.getByRole('link', { name: /A17/ }).click();
      const hands = await InstallerHands.on(onPhone);
      expect(await hands.work(6, 3)).toBe(6);
      await until(
        async () => (await server.services.sequences.show(await sequenceOf('A17'))).entries.length >= 7,
      );
    },
    120_000,
  );

  stage(
    'shows a step as done without a network, and sends it when there is one',
    async () => {
      await phone.setOffline(true);
      const id = await sequenceOf('A17');
      const before = (await server.services.sequences.show(id)).entries.length;
      const hands = await handsWithoutNetwork(onPhone);
      await hands.work(1, 3);
      expect((await server.services.sequences.show(id)).entries.length).toBe(before);
      await phone.setOffline(false);
      await until(async () => (await server.services.sequences.show(id)).entries.length > before);
    },
    60_000,
  );

  stage(
    'goes on where it was on another device, and submits',
    async () => {
      await phone.close();
      phone = await browser.device(PHONE);
      onPhone = await browser.signIn(phone, store.people.installer.email);
      await lead.goto('/review');
      await lead.getByText('Nothing waits for review').waitFor();
      await onPhone.getByRole('link', { name: /A17/ }).click();
      const hands = await InstallerHands.on(onPhone);
      expect(await hands.work(60, 3)).toBeLessThan(60);
      await onPhone.getByRole('button', { name: 'Submit', exact: true }).click();
      await onPhone.getByText('Submitted. It waits for a lead.').waitFor();
    },
    180_000,
  );

  stage('shows it in the lead’s open queue at once, without a reload', async () => {
    await lead.getByRole('link', { name: 'Review circuit A17' }).waitFor({ timeout: 5_000 });
    await lead.getByRole('link', { name: 'Review circuit A17' }).click();
    await lead.getByText('Eyes first').waitFor();
    await lead.locator('app-step-evidence h2').filter({ hasText: 'Superheat' }).waitFor();
    await lead.getByText('Outside, high').first().waitFor();
  });

  stage(
    'sends one step back with a remark, of which the installer gets a mail',
    async () => {
      await lead.getByLabel(/Remark on step/).fill('Above the band: open the valve a little.');
      await lead.getByRole('button', { name: /^Send back/ }).click();
      await lead.getByRole('button', { name: 'Send back with remarks' }).click();
      await lead.getByText('Sent back with your remarks.').waitFor();
      const mail = await until(async () => (await server.mails())[0]);
      expect(mail.to).toEqual([store.people.installer.email]);
      expect(mail.text).toContain('Above the band: open the valve a little.');
    },
    60_000,
  );

  stage(
    'has the installer redo that step alone, and submit again',
    async () => {
      await onPhone.goto(`/work/${await sequenceOf('A17')}`);
      await onPhone.getByText('Above the band: open the valve a little.').waitFor();
      const hands = await InstallerHands.on(onPhone);
      const asked = hands.currentStep();
      expect(asked.kind).toBe('superheat');
      // The signature stood under the old reading, so it is asked again too, and nothing else.
      expect(await hands.work(5)).toBe(2);
      expect([...hands.kinds]).toEqual(['superheat', 'signature']);
      await onPhone.getByRole('button', { name: 'Submit', exact: true }).click();
      await onPhone.getByText('Submitted. It waits for a lead.').waitFor();
    },
    60_000,
  );

  stage(
    'is approved with a signature that binds what the lead saw',
    async () => {
      await lead.goto('/review');
      await lead.getByRole('link', { name: 'Review circuit A17' }).click();
      await lead.getByRole('button', { name: 'Approve', exact: true }).click();
      await drawSignature(lead);
      await lead.getByRole('button', { name: 'Sign and approve' }).click();
      await lead.getByText('Approved and signed.').waitFor();
      const detail = await server.services.sequences.show(await sequenceOf('A17'));
      expect(detail.fold.state).toBe('approved');
      expect(findBrokenLink(detail.entries)).toBeNull();
    },
    60_000,
  );

  stage(
    'is handed over: the lead issues, the contractor gets a link by mail',
    async () => {
      await lead.goto(`/openings/${store.openingId}/packages`);
      await lead.getByRole('button', { name: 'Issue a new version' }).click();
      await lead.getByText('1 of 82 circuits is approved, 81 are not.').waitFor();
      await lead.getByRole('button', { name: 'Issue', exact: true }).click();
      await lead.getByText('Issued, not accepted yet').waitFor({ timeout: 60_000 });
      const mail = await until(async () =>
        (await server.mails()).find(({ to }) => to[0] === store.people.contractor.email),
      );
      packageLink = /http:\/\/localhost:4000(\/packages\/\S+)/.exec(mail.text)?.[1] ?? '';
      expect(packageLink).not.toBe('');
    },
    90_000,
  );

  stage(
    'is read and accepted by the contractor with a signature',
    async () => {
      const contractor = await browser.signIn(
        await browser.device(LAPTOP),
        store.people.contractor.email,
        packageLink,
      );
      expect(new URL(contractor.url()).pathname).toBe(packageLink);
      const href = await contractor.getByRole('link', { name: 'Open the PDF' }).getAttribute('href');
      const head = await contractor.evaluate(
        async (url) => (await (await fetch(url ?? '')).text()).slice(0, 8),
        href,
      );
      expect(head).toMatch(/^%PDF-1\./);
      await drawSignature(contractor);
      await contractor.getByRole('button', { name: 'Sign and accept' }).click();
      await contractor.getByText('Certificate of acceptance').waitFor();
      expect(await server.sql('SELECT id FROM acceptance')).toHaveLength(1);
    },
    60_000,
  );

  stage('leaves no complaint in any page’s console', () => {
    // Chromium itself reports the requests that failed while the network was switched off.
    const expected = /ERR_INTERNET_DISCONNECTED|net::ERR_/;
    expect(browser.complaints.filter((complaint) => !expected.test(complaint))).toEqual([]);
  });
});

/** Like InstallerHands.on, for a phone that has no network: the sequence is read from what the page holds. */
async function handsWithoutNetwork(page: Page): Promise<InstallerHands> {
  const id = new URL(page.url()).pathname.split('/').at(-1) as SequenceId;
  return new InstallerHands(page, await server.services.sequences.show(id));
}
