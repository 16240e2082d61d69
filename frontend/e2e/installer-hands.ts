import { expect } from '@jest/globals';
import type { Locator, Page } from 'playwright-core';
import type { Answer, Step } from '#shared/checklist/step';
import type { MeasurementAnswer, MeasurementBoxes } from '#shared/checklist/kinds/measurement';
import type { MethodField } from '#shared/checklist/methods/method';
import { METHODS } from '#shared/checklist/methods/methods';
import type { SuperheatObservation } from '#shared/checklist/kinds/superheat';
import type { SequenceDetail } from '#shared/contracts/sequences';
import { demoAnswer } from '../../backend/src/demo/demo-answer';
import { drawDemoPhoto } from '../../backend/src/demo/demo-photo';
import { steadyNumbers } from '../../backend/src/demo/steady-numbers';
import { drawSignature } from './browser';

/** Works a circuit on a phone by touching what an installer touches; only the values to type are worked out here. */
export class InstallerHands {
  private readonly random = steadyNumbers(41);
  readonly kinds = new Set<string>();

  constructor(
    private readonly page: Page,
    private readonly detail: SequenceDetail,
  ) {}

  static async on(page: Page): Promise<InstallerHands> {
    await page.locator('app-step-sheet h2').waitFor();
    const id = new URL(page.url()).pathname.split('/').at(-1);
    const detail = await page.evaluate(
      async (sequenceId) => (await fetch(`/api/sequences/${sequenceId}`)).json(),
      id,
    );
    return new InstallerHands(page, detail as SequenceDetail);
  }

  /** The step that the screen shows. */
  currentStep(): Step {
    const key = new URL(this.page.url()).searchParams.get('at');
    const step = this.detail.stepList.steps.find((candidate) => candidate.key === key);
    if (!step) throw new Error(`No step ${key} on ${this.page.url()}`);
    return step;
  }

  /** Does up to `most` steps; ends at the sheet where everything is looked over. */
  async work(most: number, superheatExcessK = 0): Promise<number> {
    for (let done = 0; done < most; done += 1) {
      if (!(await this.isAtStep())) return done;
      const step = this.currentStep();
      const before = this.page.url();
      try {
        await this.doStep(step, superheatExcessK);
        await this.page.waitForFunction((url) => document.URL !== url, before);
      } catch (error) {
        const seen = await this.page.locator('main').innerText();
        throw new Error(`Stuck at ${step.key} (${step.kind}), ${this.page.url()}\n${seen}`, { cause: error });
      }
    }
    return most;
  }

  async doStep(step: Step, superheatExcessK = 0): Promise<void> {
    this.kinds.add(step.kind);
    if (step.kind === 'trend') return this.passOver('The logger stays in for a day.');
    const answer = await demoAnswer(step, {
      specification: this.detail.specification,
      facts: this.detail.stepList.facts,
      author: '',
      random: this.random,
      photo: async () => ({
        sha256: '',
        originalSha256: null,
        bytes: 1,
        width: 1,
        height: 1,
        capturedAt: null,
      }),
      superheatExcessK,
    });
    await this.enter(step, answer);
    if (answer.kind === 'override')
      await this.page.getByRole('button', { name: 'I have put it back' }).click();
    else await this.record();
  }

  /** What nobody has on the day itself is left with its reason. */
  private async passOver(reason: string): Promise<void> {
    const form = this.page.locator('app-not-applicable');
    await form.locator('summary').click();
    await form.locator('textarea').fill(reason);
    await this.page.waitForTimeout(700);
    await form.getByRole('button').click();
  }

  /** The button rests for a moment after each recording, and asks first about what lies outside. */
  private async record(): Promise<void> {
    const action = this.page.locator('app-step-sheet footer button.main');
    await this.page.waitForTimeout(700);
    await action.click();
    const question = this.page.locator('app-step-sheet footer .question');
    const asks = await question.waitFor({ timeout: 300 }).then(
      () => true,
      () => false,
    );
    if (!asks) return;
    await this.page.waitForTimeout(700);
    await action.click();
  }

  private async isAtStep(): Promise<boolean> {
    await this.page.locator('app-step-sheet h2, app-submit-sheet h2').first().waitFor();
    return (await this.page.locator('app-step-sheet h2').count()) > 0;
  }

  private async enter(step: Step, answer: Answer): Promise<void> {
    const { page } = this;
    switch (answer.kind) {
      case 'confirm':
        return;
      case 'choose': {
        const label =
          step.kind === 'choose'
            ? step.options.find((option) => option.value === answer.value)?.label.en
            : '';
        await page
          .locator('app-choose-step')
          .getByText(label ?? '', { exact: true })
          .click();
        return;
      }
      case 'reading':
        await page.locator('app-reading-step input').fill(answer.value.text);
        return;
      case 'measurement':
        await this.enterMeasurement(answer);
        return;
      case 'superheat':
        await this.enterSuperheat(answer.asFound, answer.asLeft);
        return;
      case 'photo':
        await this.choosePhotos(answer.photos.length);
        return;
      case 'note':
        await page.getByLabel('Your words').fill(answer.text);
        return;
      case 'override':
        await this.setOverride();
        return;
      case 'signature':
        await drawSignature(page);
    }
  }

  private async enterMeasurement(answer: MeasurementAnswer): Promise<void> {
    const { fields, rows } = METHODS[answer.method];
    const form = this.page.locator('app-measurement-step');
    await this.enterBoxes(form.locator('> app-measurement-boxes'), fields, answer);
    for (const [index, row] of answer.rows.entries()) {
      const at = form.locator('fieldset.row').nth(index);
      if (!(await at.isVisible())) await form.locator('button.add').click();
      await this.enterBoxes(at, rows?.fields ?? [], row);
    }
  }

  private async enterBoxes(
    form: Locator,
    fields: readonly MethodField[],
    { quantities, words }: Pick<MeasurementBoxes, 'quantities' | 'words'>,
  ): Promise<void> {
    for (const field of fields) {
      const text = field.kind === 'quantity' ? quantities[field.key]?.text : words[field.key];
      if (text === undefined) continue;
      if (field.kind === 'choice') {
        const label = field.options.find((option) => option.value === text)?.label.en ?? '';
        await form.getByText(label, { exact: true }).click();
      } else {
        const suffix = field.kind === 'quantity' && !field.required ? ' (if known)' : '';
        await form.getByLabel(`${field.label.en}${suffix}`, { exact: true }).fill(text);
      }
    }
  }

  private async enterSuperheat(
    found: SuperheatObservation | null,
    left: SuperheatObservation,
  ): Promise<void> {
    if (found) await this.enterPair(found);
    await this.page.getByText('As left', { exact: true }).click();
    await this.enterPair(left);
    await this.meetConditions();
    await expect(this.page.locator('app-live-judgement').innerText()).resolves.toMatch(/°F/);
  }

  /** Prefilled at the second coil of a circuit: what is ticked already stays so. */
  private async meetConditions(): Promise<void> {
    const conditions = this.page.locator('app-superheat-conditions');
    if (await conditions.getByText('all met', { exact: true }).isVisible()) return;
    await conditions.locator('summary').click();
    for (const box of await conditions.getByRole('checkbox').all()) await box.check();
  }

  private async enterPair(observation: SuperheatObservation): Promise<void> {
    if (observation.valve !== 'steady') throw new Error('Only steady valves are typed here');
    await this.page.getByLabel('Suction pressure at the coil').fill(observation.pair.pressure.text);
    await this.page.getByLabel('Line temperature at the bulb').fill(observation.pair.temperature.text);
  }

  private async choosePhotos(count: number): Promise<void> {
    for (let index = 0; index < count; index += 1) {
      const buffer = await drawDemoPhoto(this.random, 400);
      await this.page
        .locator('app-photo-step input[type=file][multiple]')
        .setInputFiles({ name: `photo-${index}.jpg`, mimeType: 'image/jpeg', buffer });
      await this.page.locator(`app-photo-step li:nth-child(${index + 1}) img`).waitFor();
    }
  }

  private async setOverride(): Promise<void> {
    const putBack = this.page.getByRole('button', { name: 'I have put it back' });
    if (await putBack.isVisible()) return;
    const key = this.currentStep().key;
    await this.record();
    // The stepper goes on to other work while it stands; come back to put it back.
    await this.page.waitForFunction((at) => new URL(document.URL).searchParams.get('at') !== at, key);
    await this.page.getByRole('button', { name: 'Still set' }).click();
    await putBack.waitFor();
    await this.page.waitForTimeout(700);
  }
}
