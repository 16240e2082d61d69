import { deviceRequestSchema, deviceResponseSchema } from '#shared/contracts/session';
import { defineRoute } from '../../http/define-route';
import type { SessionDoor } from '../session-door';

/** POST /devices */
export const registerDevice = (door: SessionDoor) =>
  defineRoute({
    method: 'post',
    path: '/devices',
    summary: 'Register this browser as a device of the own account',
    access: { kind: 'self', reason: 'A device speaks only for its own person.' },
    body: deviceRequestSchema,
    response: deviceResponseSchema,
    handle: ({ caller, body, exchange }) =>
      door.registerDevice(exchange.request, exchange.response, caller.person, body.deviceId, body.label),
  });
