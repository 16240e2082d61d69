import { Injectable } from '@angular/core';
import type { DefrostCircuit, DefrostRules } from '#shared/refrigeration/defrost/defrost-plan-types';
import type { DefrostPlanning } from '#shared/refrigeration/defrost/plan-defrosts';

export interface PlanQuestion {
  readonly circuits: readonly DefrostCircuit[];
  readonly rules: DefrostRules;
}

/** Lays a day out in a worker of its own. */
@Injectable({ providedIn: 'root' })
export class Planner {
  /**
   * @param signal ends the worker
   * @throws an AbortError when the signal fires; an Error when the worker could not be started or broke down
   */
  async plan(question: PlanQuestion, signal: AbortSignal): Promise<DefrostPlanning> {
    const { startPlanWorker } = await import('./start-plan-worker');
    signal.throwIfAborted();
    const worker = startPlanWorker();
    try {
      return await new Promise<DefrostPlanning>((resolve, reject) => {
        signal.addEventListener('abort', () => reject(signal.reason as Error), { once: true });
        worker.onmessage = ({ data }: MessageEvent<DefrostPlanning>) => resolve(data);
        worker.onerror = (event) => reject(new Error(`The planner broke down: ${event.message}`));
        worker.postMessage(question);
      });
    } finally {
      worker.terminate();
    }
  }
}
