import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { PAGE_SIZE_MAX } from '#shared/contracts/paging';
import {
  refrigerantTableListSchema,
  refrigerantTableSchema,
  type NewRefrigerantTable,
  type RefrigerantTable,
} from '#shared/contracts/refrigerants';
import { readAllPages, type WholeList } from '../ui/pages/all-pages';
import { parsed } from '../ui/pages/parsed';

/** More sheets than a company will ever enter. */
const MOST = 1000;

const URL = '/api/refrigerant-tables';

/** The refrigerant makers' tables of the own company. */
@Injectable({ providedIn: 'root' })
export class RefrigerantsApi {
  private readonly http = inject(HttpClient);

  /** All of them, newest first. */
  tables(): Promise<WholeList<RefrigerantTable>> {
    return readAllPages((after) => {
      const params = after === null ? { limit: PAGE_SIZE_MAX } : { limit: PAGE_SIZE_MAX, after };
      return parsed(this.http.get(URL, { params }), refrigerantTableListSchema);
    }, MOST);
  }

  add(table: NewRefrigerantTable): Promise<RefrigerantTable> {
    return parsed(this.http.post(URL, table), refrigerantTableSchema);
  }
}
