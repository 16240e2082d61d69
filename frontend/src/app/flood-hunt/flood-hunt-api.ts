import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { floodHuntSchema, type FloodHunt } from '#shared/contracts/flood-hunt';
import type { OpeningId, SuctionGroupId } from '#shared/plant/ids';
import { parsed } from '../ui/pages/parsed';

/** How the coils of a suction group were left. */
@Injectable({ providedIn: 'root' })
export class FloodHuntApi {
  private readonly http = inject(HttpClient);

  read(openingId: OpeningId, suctionGroupId: SuctionGroupId): Promise<FloodHunt> {
    return parsed(
      this.http.get(`/api/openings/${openingId}/suction-groups/${suctionGroupId}/coils`),
      floodHuntSchema,
    );
  }
}
