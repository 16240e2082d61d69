import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import {
  circuitListSchema,
  openingDetailSchema,
  openingListSchema,
  openingPeopleSchema,
  type CircuitRow,
  type NewOpening,
  type OpeningDetail,
  type OpeningPerson,
  type OpeningSummary,
} from '#shared/contracts/openings';
import { PAGE_SIZE_MAX } from '#shared/contracts/paging';
import type { CircuitId, OpeningId, PersonId } from '#shared/plant/ids';
import { firstValueFrom } from 'rxjs';
import { readAllPages, type WholeList } from '../ui/pages/all-pages';
import { parsed } from '../ui/pages/parsed';

/** More openings than anybody follows at once, and more circuits than any store has. */
const MOST = 1000;

/** Openings, their circuits and their people. */
@Injectable({ providedIn: 'root' })
export class OpeningsApi {
  private readonly http = inject(HttpClient);

  /** All openings that the person may see. */
  openings(): Promise<WholeList<OpeningSummary>> {
    return readAllPages(
      (after) => parsed(this.http.get('/api/openings', { params: pageAfter(after) }), openingListSchema),
      MOST,
    );
  }

  opening(openingId: OpeningId): Promise<OpeningDetail> {
    return parsed(this.http.get(`/api/openings/${openingId}`), openingDetailSchema);
  }

  create(opening: NewOpening): Promise<OpeningDetail> {
    return parsed(this.http.post('/api/openings', opening), openingDetailSchema);
  }

  /** All circuits of an opening, in the order of the server. */
  circuits(openingId: OpeningId): Promise<WholeList<CircuitRow>> {
    const url = `/api/openings/${openingId}/circuits`;
    return readAllPages(
      (after) => parsed(this.http.get(url, { params: pageAfter(after) }), circuitListSchema),
      MOST,
    );
  }

  async people(openingId: OpeningId): Promise<readonly OpeningPerson[]> {
    const { people } = await parsed(this.http.get(`/api/openings/${openingId}/people`), openingPeopleSchema);
    return people;
  }

  /** Gives circuits to a person, or to nobody. */
  async assign(
    openingId: OpeningId,
    circuitIds: readonly CircuitId[],
    personId: PersonId | null,
  ): Promise<void> {
    await firstValueFrom(this.http.put(`/api/openings/${openingId}/assignments`, { circuitIds, personId }));
  }
}

function pageAfter(after: string | null): Record<string, string | number> {
  return after === null ? { limit: PAGE_SIZE_MAX } : { limit: PAGE_SIZE_MAX, after };
}
