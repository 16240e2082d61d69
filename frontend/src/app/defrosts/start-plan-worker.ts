// By the name `Worker` the build finds the worker's file and bundles it.
import { TrustedWorker as Worker } from '../ui/trusted-worker/trusted-worker';

/** Starts a planner beside the page; it answers one message with one plan. */
export const startPlanWorker = (): Worker =>
  new Worker(new URL('./plan.worker', import.meta.url), { type: 'module' });
