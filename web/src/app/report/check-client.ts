import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import { EMPTY, expand, map, reduce } from 'rxjs';
import type {
  BlockWords,
  CheckDetails,
  FindingPage,
  LineRange,
  MachineDetails,
  PlanPath,
  StoredFinding,
} from '#contracts';
import {
  blockWordsSchema,
  checkDetailsSchema,
  findingPageSchema,
  lineRangeSchema,
  machineDetailsSchema,
  pathSchema,
} from '#contracts';
import { parsed } from '../http/parsed';

/** The most findings the server hands out at once. */
export const FINDINGS_AT_ONCE = 5000;

/** Reads checks, their findings and path, and lines of the program they were held over. */
@Injectable({ providedIn: 'root' })
export class CheckClient {
  readonly #http = inject(HttpClient);

  details(id: string): Observable<CheckDetails> {
    return this.#http.get(`/api/v1/checks/${id}`).pipe(parsed(checkDetailsSchema));
  }

  /** Every finding, page after page, in the report's order. */
  findings(id: string): Observable<readonly StoredFinding[]> {
    return this.#findingPage(id, 0).pipe(
      expand((page, index) => {
        const read = (index + 1) * FINDINGS_AT_ONCE;
        return page.findings.length > 0 && read < page.total ? this.#findingPage(id, read) : EMPTY;
      }),
      map((page) => page.findings),
      reduce((all, page) => [...all, ...page], [] as readonly StoredFinding[]),
    );
  }

  path(id: string): Observable<PlanPath> {
    return this.#http.get(`/api/v1/checks/${id}/path`).pipe(parsed(pathSchema));
  }

  lines(revisionId: string, from: number, to: number): Observable<LineRange> {
    return this.#http
      .get(`/api/v1/program-revisions/${revisionId}/lines`, { params: { from, to } })
      .pipe(parsed(lineRangeSchema));
  }

  words(revisionId: string, line: number): Observable<BlockWords> {
    return this.#http
      .get(`/api/v1/program-revisions/${revisionId}/words`, { params: { line } })
      .pipe(parsed(blockWordsSchema));
  }

  /** The machine as it stands now, to say what has changed since a check. */
  machine(id: string): Observable<MachineDetails> {
    return this.#http.get(`/api/v1/machines/${id}`).pipe(parsed(machineDetailsSchema));
  }

  #findingPage(id: string, offset: number): Observable<FindingPage> {
    return this.#http
      .get(`/api/v1/checks/${id}/findings`, { params: { offset, limit: FINDINGS_AT_ONCE } })
      .pipe(parsed(findingPageSchema));
  }
}
