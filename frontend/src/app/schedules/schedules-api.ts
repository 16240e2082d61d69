import {
  HttpClient,
  HttpEventType,
  HttpXhrBackend,
  HttpXsrfTokenExtractor,
  type HttpEvent,
} from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { filter, map, type Observable } from 'rxjs';
import { scheduleImportSchema, type ScheduleImport } from '#shared/contracts/schedules';
import type { OpeningId } from '#shared/plant/ids';

/** How far an upload is: the share of the file that has left, `null` while the server reads it, then what it read. */
export type UploadStep = { readonly sent: number | null } | { readonly read: ScheduleImport };

/** Sends a schedule, to be checked or stored. Unsubscribing stops the upload. */
@Injectable({ providedIn: 'root' })
export class SchedulesApi {
  // The application's own client goes through fetch, which doesn't say how much of a body has left; this one does.
  private readonly http = new HttpClient(inject(HttpXhrBackend));
  private readonly token = inject(HttpXsrfTokenExtractor);

  /** @param store `false` only reads and checks the file */
  upload(openingId: OpeningId, file: File, store: boolean): Observable<UploadStep> {
    const body = new FormData();
    body.append('schedule', file, file.name);
    const token = this.token.getToken();
    return this.http
      .post(`/api/openings/${openingId}/schedule-imports`, body, {
        params: { store },
        headers: token ? { 'X-XSRF-TOKEN': token } : {},
        observe: 'events',
        reportProgress: true,
      })
      .pipe(
        map((event) => stepOf(event)),
        filter((step): step is UploadStep => step !== null),
      );
  }
}

function stepOf(event: HttpEvent<unknown>): UploadStep | null {
  if (event.type === HttpEventType.Response) return { read: scheduleImportSchema.parse(event.body) };
  if (event.type !== HttpEventType.UploadProgress) return null;
  const sent = event.total ? event.loaded / event.total : 0;
  return { sent: sent < 1 ? sent : null };
}
