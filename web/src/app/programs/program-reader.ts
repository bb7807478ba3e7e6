import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import type { ProgramDetails, ProgramPage as Page } from '#contracts';
import { programDetailsSchema, programPageSchema } from '#contracts';
import { parsed } from '../http/parsed';
import type { JobDocument } from './job-sheet';
import type { ListQuery } from './list-query';

/** Programs as the shop has them. */
@Injectable({ providedIn: 'root' })
export class ProgramReader {
  readonly #http = inject(HttpClient);

  page({
    search,
    verdict,
    machineId,
    sort,
    direction,
    offset,
    limit,
  }: ListQuery): Observable<Page> {
    const params = {
      ...{ sort, direction, offset, limit },
      ...(search ? { search } : {}),
      ...(verdict ? { verdict } : {}),
      ...(machineId ? { machineId } : {}),
    };
    return this.#http.get('/api/v1/programs', { params }).pipe(parsed(programPageSchema));
  }

  details(id: string): Observable<ProgramDetails> {
    return this.#http
      .get(`/api/v1/programs/${encodeURIComponent(id)}`)
      .pipe(parsed(programDetailsSchema));
  }

  saveJob(id: string, job: JobDocument, basedOn: number): Observable<ProgramDetails> {
    return this.#http
      .put(`/api/v1/programs/${encodeURIComponent(id)}/job`, { basedOn, job })
      .pipe(parsed(programDetailsSchema));
  }
}
