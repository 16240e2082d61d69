import { CdkStepper, CdkStepperModule } from '@angular/cdk/stepper';
import { NgTemplateOutlet } from '@angular/common';
import { ChangeDetectionStrategy, Component } from '@angular/core';

/**
 * The stepper with our own face: no row of headers (the copper line above it is that), one step at a time, any step
 * reachable from any other. What a step shows is its content; back and next are the CDK's own directives in it.
 */
@Component({
  selector: 'app-step-run',
  imports: [CdkStepperModule, NgTemplateOutlet],
  providers: [{ provide: CdkStepper, useExisting: StepRun }],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <div [id]="_getStepContentId(selectedIndex)">
      <ng-container [ngTemplateOutlet]="selected?.content ?? null" />
    </div>
  `,
})
export class StepRun extends CdkStepper {}
