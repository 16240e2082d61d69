import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import {
  defrostPlanPageSchema,
  savedDefrostPlanSchema,
  type DefrostPlanPage,
  type DefrostPlanRequest,
  type SavedDefrostPlan,
} from '#shared/contracts/defrost-plans';
import type { OpeningId } from '#shared/plant/ids';
import { parsed } from '../ui/pages/parsed';

/** The defrost plan of an opening: every save is a version of its own. */
@Injectable({ providedIn: 'root' })
export class DefrostsApi {
  private readonly http = inject(HttpClient);

  read(openingId: OpeningId): Promise<DefrostPlanPage> {
    return parsed(this.http.get(`/api/openings/${openingId}/defrost-plan`), defrostPlanPageSchema);
  }

  /** Fails with `changedMeanwhile` when another version was saved since `basedOn`. */
  save(openingId: OpeningId, request: DefrostPlanRequest): Promise<SavedDefrostPlan> {
    return parsed(this.http.post(`/api/openings/${openingId}/defrost-plan`, request), savedDefrostPlanSchema);
  }
}
