import * as z from 'zod/mini';
import { pageQueryShape } from '#shared/contracts/paging';
import { refrigerantTableListSchema } from '#shared/contracts/refrigerants';
import { defineRoute } from '../../http/define-route';
import type { RefrigerantsService } from '../refrigerants.service';

/** GET /refrigerant-tables */
export const listRefrigerantTables = (refrigerants: RefrigerantsService) =>
  defineRoute({
    method: 'get',
    path: '/refrigerant-tables',
    summary: 'Refrigerant makers’ tables of the caller’s company, newest first',
    access: { kind: 'action', action: 'refrigerant.read', subject: 'company' },
    query: z.object(pageQueryShape),
    response: refrigerantTableListSchema,
    handle: ({ caller, query }) => refrigerants.list(caller.person, query.limit ?? 50, query.after),
  });
