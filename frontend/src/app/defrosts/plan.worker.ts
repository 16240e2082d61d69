import { planDefrosts } from '#shared/refrigeration/defrost/plan-defrosts';
import type { PlanQuestion } from './planner';

// A search may take seconds: here it doesn't freeze the page, and ending the worker ends it.
addEventListener('message', ({ data }: MessageEvent<PlanQuestion>) => {
  postMessage(planDefrosts(data.circuits, data.rules));
});
