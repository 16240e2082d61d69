import { healthSchema } from '#shared/contracts/health';
import { defineRoute } from '../../http/define-route';
import type { HealthService } from '../health.service';

/** GET /health */
export const showHealth = (health: HealthService) =>
  defineRoute({
    method: 'get',
    path: '/health',
    summary: 'Whether all parts are up: 200, or 503 with the reason',
    access: { kind: 'public', reason: 'Load balancers and the start script ask without an account.' },
    response: healthSchema,
    async handle({ exchange }) {
      const state = await health.check();
      if (!state.up) exchange.response.status(503);
      return state;
    },
  });
