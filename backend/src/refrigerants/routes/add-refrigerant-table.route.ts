import { newRefrigerantTableSchema, refrigerantTableSchema } from '#shared/contracts/refrigerants';
import { defineRoute } from '../../http/define-route';
import type { RefrigerantsService } from '../refrigerants.service';

/** POST /refrigerant-tables */
export const addRefrigerantTable = (refrigerants: RefrigerantsService) =>
  defineRoute({
    method: 'post',
    path: '/refrigerant-tables',
    summary: 'Keep a refrigerant maker’s pressure–temperature table for the caller’s company',
    access: { kind: 'action', action: 'refrigerant.add', subject: 'company' },
    body: newRefrigerantTableSchema,
    response: refrigerantTableSchema,
    status: 201,
    handle: ({ caller, body }) => refrigerants.create(caller.person, body),
  });
