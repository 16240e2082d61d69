import type { Type } from '@angular/core';
import type { StepKind } from '#shared/checklist/step';
import { ChooseStep } from './choose-step';
import { ConfirmStep } from './confirm-step';
import { MeasurementStep } from './measurement-step';
import { NoteStep } from './note-step';
import { OverrideStep } from './override-step';
import { PhotoStep } from './photo-step';
import { ReadingStep } from './reading-step';
import { SignatureStep } from './signature-step';
import { SuperheatStep } from './superheat-step';
import { TrendStep } from './trend-step';

/** The component that takes each kind's answer. A new kind doesn't compile until it is here. */
export const STEP_COMPONENTS: Readonly<Record<StepKind, Type<unknown>>> = {
  confirm: ConfirmStep,
  choose: ChooseStep,
  reading: ReadingStep,
  superheat: SuperheatStep,
  measurement: MeasurementStep,
  trend: TrendStep,
  photo: PhotoStep,
  note: NoteStep,
  override: OverrideStep,
  signature: SignatureStep,
};
