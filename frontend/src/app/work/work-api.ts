import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { circuitListSchema, type CircuitRow } from '#shared/contracts/openings';
import { PAGE_SIZE_MAX } from '#shared/contracts/paging';
import { sequenceDetailSchema, type SequenceDetail } from '#shared/contracts/sequences';
import type { SequenceId } from '#shared/plant/ids';
import { firstValueFrom, timeout } from 'rxjs';
import { quietly } from '../session/session-context';

const TIMEOUT_MS = 20_000;

/** Reads what an installer works on. The phone's own credential is enough, so none of these opens a dialog. */
@Injectable({ providedIn: 'root' })
export class WorkApi {
  private readonly http = inject(HttpClient);

  /** All circuits assigned to whoever is here, page by page. */
  async myCircuits(): Promise<readonly CircuitRow[]> {
    const rows: CircuitRow[] = [];
    let after: string | null = null;
    do {
      const params: Record<string, string | number> = { limit: PAGE_SIZE_MAX, ...(after ? { after } : {}) };
      const page = circuitListSchema.parse(await this.get('/api/my/circuits', params));
      rows.push(...page.items);
      after = page.next;
    } while (after !== null);
    return rows;
  }

  async sequence(id: SequenceId): Promise<SequenceDetail> {
    return sequenceDetailSchema.parse(await this.get(`/api/sequences/${id}`, {}));
  }

  private get(url: string, params: Record<string, string | number>): Promise<unknown> {
    return firstValueFrom(this.http.get(url, { params, context: quietly() }).pipe(timeout(TIMEOUT_MS)));
  }
}
